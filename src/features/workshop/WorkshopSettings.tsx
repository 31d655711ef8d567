import { useQuery } from '@tanstack/react-query';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { SettingsForm } from './SettingsForm.tsx';
import { workshopQuery } from './workshop.queries.ts';

/** The workshop's name, zone, money and codes. */
export function WorkshopSettings() {
  const workshop = useQuery(workshopQuery);
  if (workshop.data) return <SettingsForm workshop={workshop.data} />;
  if (workshop.isError) return <ErrorState error={workshop.error} onRetry={() => void workshop.refetch()} />;
  return <LoadingShape says="Reading the settings" rows={5} rowClassName="h-14" />;
}
