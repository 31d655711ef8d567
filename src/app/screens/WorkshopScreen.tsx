import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { TabLinks } from '#src/components/TabLinks.tsx';
import { Trail } from '#src/features/audit/Trail.tsx';
import { People } from '#src/features/members/People.tsx';
import { Outbox } from '#src/features/outbox/Outbox.tsx';
import { outboxQuery } from '#src/features/outbox/outbox.queries.ts';
import { MySettings } from '#src/features/session/MySettings.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { WorkshopSettings } from '#src/features/workshop/WorkshopSettings.tsx';
import { paths } from '../paths.ts';

const PARTS = { people: People, settings: WorkshopSettings, me: MySettings, trail: Trail, outbox: Outbox } as const;
type Part = keyof typeof PARTS;
const LABELS: Record<Part, string> = { people: 'People', settings: 'Settings', me: 'My settings', trail: 'Trail', outbox: 'Outbox' };

/** People, settings, one's own settings and what was done; what is not for the role has no tab. */
export function Component() {
  const { workshop } = useSession();
  const may = useMay();
  const isOwner = may('workshop.manage');
  // The page is not there in production; asking is the only way to know.
  const outbox = useQuery({ ...outboxQuery, enabled: isOwner });
  const parts: Part[] = ['people', ...(isOwner ? ['settings' as const] : []), 'me', ...(may('audit.read') ? ['trail' as const] : []), ...(outbox.isSuccess ? ['outbox' as const] : [])];
  const asked = useSearchParams()[0].get('tab');
  const current = parts.find((part) => part === asked) ?? 'people';
  const Shown = PARTS[current];
  return (
    <div className="grid gap-6">
      <h1>{workshop.name}</h1>
      <TabLinks label="Parts of the workshop" current={current} tabs={parts.map((key) => ({ key, label: LABELS[key], to: `${paths.workshop}?tab=${key}` }))} />
      <Shown />
    </div>
  );
}
