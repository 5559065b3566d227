import { queryOptions, useQuery } from '@tanstack/react-query';
import type { MeHome } from '@slighthill/shared/contracts/me';
import { translate } from '../../i18n/translate';
import { apiFetch } from '../../lib/api-fetch';
import { clinicDateOf, formatLongDate } from '../../lib/clinic-time';
import { usePageTitle } from '../../lib/page-title';
import { useClinicZone } from '../../lib/session';
import { ErrorNotice } from '../../ui/error-notice';
import { Icon } from '../../ui/icon';
import { SkeletonBar } from '../../ui/skeleton';
import { VisuallyHidden } from '../../ui/visually-hidden';
import { greetingKey } from './greeting-key';

const homeQuery = queryOptions({
  queryKey: ['me', 'home'],
  queryFn: ({ signal }) => apiFetch<MeHome>('/api/me/home', { signal }),
});

const card = 'rounded-card border border-line bg-surface p-5';

const ProgramCard = ({ program }: Pick<MeHome, 'program'>) => {
  const todayOn = clinicDateOf(new Date(), useClinicZone());
  if (!program) return <p className={card}>{translate('home.program.none')}</p>;
  return (
    <section className={card}>
      <h2 className="text-p-label text-ink-soft">{translate('home.program')}</h2>
      <p className="text-p-heading">{program.name}</p>
      <p>{translate('home.program.sessions', { count: program.plannedSessions, weeks: program.weeks })}</p>
      <p className="text-p-note text-ink-soft">
        {translate(program.startOn > todayOn ? 'home.program.starts' : 'home.program.started', {
          date: formatLongDate(program.startOn),
        })}
      </p>
    </section>
  );
};

const CallCard = ({ clinic }: Pick<MeHome, 'clinic'>) => {
  if (clinic.phone === null) return null;
  return (
    <section className={card}>
      <h2 className="text-p-section">{translate('home.questions')}</h2>
      <a
        href={`tel:${clinic.phone.replace(/[^+\d]/g, '')}`}
        className="mt-3 flex min-h-14 items-center justify-center gap-3 rounded-control bg-tarn px-5 text-p-button text-surface hover:bg-tarn-deep"
      >
        <Icon name="phone" size={22} />
        {translate('home.call-clinic', { phone: clinic.phone })}
      </a>
    </section>
  );
};

const EmergencyCard = () => (
  <section className="flex gap-4 rounded-card bg-rowan-wash p-5 text-rowan-ink">
    <Icon name="phone" size={26} className="mt-1" />
    <div>
      <h2 className="text-p-body font-bold">{translate('emergency.question')}</h2>
      <p>{translate('emergency.answer')}</p>
    </div>
  </section>
);

const Loading = () => (
  <div role="status" className="flex flex-col gap-4">
    <VisuallyHidden>Loading</VisuallyHidden>
    <SkeletonBar widthPercent={70} heightPx={30} />
    <div className={card}>
      <SkeletonBar widthPercent={40} />
      <div className="mt-4">
        <SkeletonBar widthPercent={80} heightPx={24} />
      </div>
    </div>
  </div>
);

/** What a patient sees first. It says only what is so; the other areas come with their screens. */
export const Component = () => {
  usePageTitle(translate('home.title'));
  const home = useQuery(homeQuery);
  const timeZone = useClinicZone();
  return (
    <div className="flex flex-col gap-4">
      {home.isPending && <Loading />}
      {home.error && !home.data && (
        <ErrorNotice size="patient" onRetry={() => void home.refetch()} retrying={home.isFetching}>
          {`${translate('error.load')} ${home.error.message}`}
        </ErrorNotice>
      )}
      {home.data && (
        <>
          <h1 className="text-p-title">
            {translate(greetingKey(new Date(), timeZone), { name: home.data.givenName })}
          </h1>
          <ProgramCard program={home.data.program} />
          <CallCard clinic={home.data.clinic} />
        </>
      )}
      <EmergencyCard />
      <p className="text-p-note text-ink-soft">{translate('home.caution')}</p>
    </div>
  );
};
