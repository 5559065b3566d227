import { zodResolver } from '@hookform/resolvers/zod';
import { clinicPatch, type Clinic } from '@slighthill/shared/contracts/clinic';
import { useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { applyProblem } from '../../lib/apply-problem';
import { fev1RuleChoices, ratioRuleChoices, tlcRuleChoices } from '../../lib/rule-words';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormProblem } from '../../ui/form-problem';
import { NumberInput } from '../../ui/number-input';
import { RadioGroup } from '../../ui/radio-group';
import { SavedNote } from '../../ui/saved-note';
import { TextInput } from '../../ui/text-input';
import { UnsavedWorkDialog } from '../../ui/unsaved-work-dialog';
import { useUnsavedWork } from '../../ui/use-unsaved-work';
import { useChangeClinic } from './mutations';

interface RulesFormProps {
  clinic: Clinic;
  /** Where the last save went; null before one. */
  saved: string | null;
  onSaved: () => void;
}

const fields = [
  'name',
  'timeZone',
  'phone',
  'ratioRule',
  'fev1SeverityRule',
  'tlcSeverityRule',
  'tlcWindowDays',
] as const;

const startValues = (clinic: Clinic) => ({
  version: clinic.version,
  name: clinic.name,
  timeZone: clinic.timeZone,
  phone: clinic.phone ?? '',
  ratioRule: clinic.ratioRule,
  fev1SeverityRule: clinic.fev1SeverityRule,
  tlcSeverityRule: clinic.tlcSeverityRule,
  tlcWindowDays: clinic.tlcWindowDays,
});

const block = 'flex flex-col gap-5 border-t border-rule py-5';

/** Grades are computed when they are shown, so a changed rule is seen at once; signed pages keep theirs. */
export const RulesForm = ({ clinic, saved, onSaved }: RulesFormProps) => {
  const [problem, setProblem] = useState<string | null>(null);
  const change = useChangeClinic();
  const { register, control, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(clinicPatch),
    defaultValues: startValues(clinic),
  });
  const { errors, isDirty } = formState;
  const work = useUnsavedWork(isDirty);

  const save = handleSubmit((body) => {
    setProblem(null);
    change.mutate(body, {
      onSuccess: onSaved,
      onError: (error) => setProblem(applyProblem(error, setError, fields)),
    });
  });

  return (
    <form onSubmit={(event) => void save(event)} noValidate>
      <section className={block}>
        <h2 className="text-section">Grading</h2>
        <Controller
          control={control}
          name="ratioRule"
          render={({ field }) => (
            <RadioGroup
              legend="Obstruction"
              arrange="list"
              choices={ratioRuleChoices}
              value={field.value ?? null}
              onValueChange={field.onChange}
            />
          )}
        />
        <Controller
          control={control}
          name="fev1SeverityRule"
          render={({ field }) => (
            <RadioGroup
              legend="Severity of obstruction"
              arrange="list"
              choices={fev1RuleChoices}
              value={field.value ?? null}
              onValueChange={field.onChange}
            />
          )}
        />
        <Controller
          control={control}
          name="tlcSeverityRule"
          render={({ field }) => (
            <RadioGroup
              legend="Severity of restriction"
              arrange="list"
              choices={tlcRuleChoices}
              value={field.value ?? null}
              onValueChange={field.onChange}
            />
          )}
        />
        <Controller
          control={control}
          name="tlcWindowDays"
          render={({ field: { value, onChange, onBlur, ref } }) => (
            <Field
              label="TLC counts with spirometry within"
              hint="1 to 730 days"
              error={errors.tlcWindowDays?.message}
              className="max-w-60"
            >
              <NumberInput ref={ref} unit="days" value={value} onValueChange={onChange} onBlur={onBlur} />
            </Field>
          )}
        />
      </section>
      <section className={block}>
        <h2 className="text-section">The clinic</h2>
        <Field label="Name" error={errors.name?.message}>
          <TextInput {...register('name')} autoComplete="off" />
        </Field>
        <Field label="Time zone" hint="Days and times of the whole clinic follow it" error={errors.timeZone?.message}>
          <TextInput {...register('timeZone')} autoComplete="off" spellCheck={false} />
        </Field>
        <Field
          label="Phone"
          labelNote="optional"
          hint="Patients see it as the number to call"
          error={errors.phone?.message}
        >
          <TextInput {...register('phone')} type="tel" autoComplete="off" />
        </Field>
      </section>
      <div className="flex flex-wrap items-center justify-end gap-3 border-t border-rule py-4">
        <FormProblem>{problem}</FormProblem>
        <SavedNote>{isDirty ? null : saved}</SavedNote>
        <Button kind="main" type="submit" saving={change.isPending}>
          Save rules
        </Button>
      </div>
      <UnsavedWorkDialog work={work} />
    </form>
  );
};
