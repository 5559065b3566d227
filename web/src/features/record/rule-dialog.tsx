import { useState } from 'react';
import { referenceGroups } from '@slighthill/shared/vocabulary';
import type { TrendPattern } from '@slighthill/shared/contracts/trend';
import { referenceSetLabel } from '../../charts/rule-words';
import { fev1RuleChoices, ratioRuleChoices, referenceGroupLabel } from '../../lib/rule-words';
import { useSessionUser } from '../../lib/session';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { RadioGroup } from '../../ui/radio-group';
import { Select } from '../../ui/select';
import type { TrendRules } from './queries';

interface RuleDialogProps {
  rules: TrendRules;
  pattern: TrendPattern;
  onChoose: (rules: TrendRules) => void;
  onClose: () => void;
}

const spirometrySets = ['gli-global-2022', 'gli-2012', 'nhanes-iii-1999'] as const;
const usualSet = spirometrySets[0];

const groupsOf = (set: string): readonly string[] =>
  (referenceGroups as Readonly<Record<string, readonly string[]>>)[set] ?? [];

/** Another reference set or rule for the view in front of the reader. Nothing is stored. */
export const RuleDialog = ({ rules, pattern, onChoose, onClose }: RuleDialogProps) => {
  const { clinic } = useSessionUser();
  const [set, setSet] = useState(rules.referenceSet ?? usualSet);
  const [group, setGroup] = useState(rules.group);
  const [ratio, setRatio] = useState(rules.ratioRule ?? pattern?.ratioRule ?? clinic.ratioRule);
  const [rule, setRule] = useState(rules.gradingRule ?? clinic.fev1SeverityRule);
  const [asked, setAsked] = useState(false);
  const groups = groupsOf(set);
  const missing = groups.length > 0 && (group === null || !groups.includes(group));

  const show = (): void => {
    setAsked(true);
    if (missing) return;
    onChoose({
      referenceSet: set === usualSet ? null : set,
      group: groups.length > 0 ? group : null,
      ratioRule: ratio === clinic.ratioRule ? null : ratio,
      gradingRule: rule === clinic.fev1SeverityRule ? null : rule,
    });
  };

  return (
    <Dialog
      open
      width="wide"
      title="Look by other rules"
      description="Changes only what you see here. Nothing is stored, and the clinic’s rules stay."
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button kind="main" onClick={show}>
            Show
          </Button>
        </>
      }
    >
      <div className="mt-4 flex flex-col gap-5">
        <Field label="Reference set for spirometry" hint="Lung volumes and transfer factor have one set each">
          <Select
            value={set}
            onChange={(event) => setSet(event.target.value)}
            choices={spirometrySets.map((id) => ({ value: id, label: referenceSetLabel(id) }))}
          />
        </Field>
        {groups.length > 0 && (
          <RadioGroup
            legend="Ancestry group printed in this set"
            hint="Asked each time and not stored on the patient"
            error={asked && missing ? 'This set needs a group' : undefined}
            choices={groups.map((id) => ({ value: id, label: referenceGroupLabel(id) }))}
            value={group}
            onValueChange={setGroup}
          />
        )}
        <RadioGroup<string> legend="Ratio rule" choices={ratioRuleChoices} value={ratio} onValueChange={setRatio} />
        <RadioGroup<string>
          legend="Grading rule"
          arrange="list"
          choices={fev1RuleChoices}
          value={rule}
          onValueChange={setRule}
        />
      </div>
    </Dialog>
  );
};
