import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Suspense } from 'react';
import { describe, expect, it, vi } from 'vitest';
import type { LotView } from '#shared/lots.ts';
import type { MaterialView } from '#shared/materials.ts';
import type { SessionView } from '#shared/session.ts';
import { emptyDraft, type BatchDraft } from '#src/features/batches/batch-draft.ts';
import { BatchForm } from '#src/features/batches/BatchForm.tsx';
import { mouldsQuery } from '#src/features/batches/batches.queries.ts';
import { formulaPickerQuery } from '#src/features/formulas/formulas.queries.ts';
import { lotPickerQuery } from '#src/features/lots/lots.queries.ts';
import { materialPickerQuery } from '#src/features/materials/materials.queries.ts';
import { membersQuery } from '#src/features/members/members.queries.ts';
import { sessionQuery } from '#src/features/session/session.queries.ts';
import { CallProblem } from '#src/lib/call.ts';

const ID = '0190a0a0-0000-7000-8000-000000000001';
const SCENT = '0190a0a0-0000-7000-8000-00000000000a';
const LOT = '0190a0a0-0000-7000-8000-00000000000b';
const session = {
  member: { id: ID, name: 'Ilse', role: 'owner' },
  account: { id: ID, email: 'a@b.example', name: 'Ilse', temperatureUnit: 'celsius', massUnit: 'gram', singleKeys: true },
  workshop: { id: ID, name: 'Test', timeZone: 'Europe/London', currency: 'EUR', isDemo: false }, workshops: [],
} satisfies SessionView;
const material = { id: SCENT, kind: 'fragrance', name: 'Ember Fig', isWithdrawn: false, isEssentialOil: false } as MaterialView;
const lot = { id: LOT, code: 'EF-7802', materialId: SCENT, materialName: 'Ember Fig', materialKind: 'fragrance', standing: 'hot-process-only', bestBeforeOn: null, certificateMaxFraction: 0.05, flashPointC: 62 } as LotView;

function show({ units = {}, start = {}, onSave = vi.fn(async () => undefined) }: { units?: Partial<SessionView['account']>; start?: Partial<BatchDraft>; onSave?: (draft: BatchDraft) => Promise<void> } = {}) {
  const client = new QueryClient({ defaultOptions: { queries: { staleTime: Infinity, retry: false } } });
  client.setQueryData(sessionQuery.queryKey, { ...session, account: { ...session.account, ...units } });
  client.setQueryData(materialPickerQuery.queryKey, [material]);
  client.setQueryData(lotPickerQuery.queryKey, [lot]);
  for (const query of [formulaPickerQuery, membersQuery, mouldsQuery]) client.setQueryData(query.queryKey, []);
  render(
    <QueryClientProvider client={client}>
      <Suspense><BatchForm start={{ ...emptyDraft(ID, '2026-03-14'), ...start }} stateNow={null} saveWords="Keep this batch" busyWords="Keeping …" onSave={onSave} away={null} /></Suspense>
    </QueryClientProvider>,
  );
  return { user: userEvent.setup(), onSave, keep: () => screen.getByRole('button', { name: 'Keep this batch' }) };
}

describe('BatchForm', () => {
  it('keeps ratio and concentration together, whichever is typed, also half-typed', async () => {
    const { user, onSave, keep } = show();
    const [ratio, concentration] = [screen.getByLabelText('Water to lye, by mass'), screen.getByLabelText('Lye concentration')];
    await user.type(concentration, '33.3');
    expect(concentration).toHaveValue('33.3');
    expect(ratio).toHaveValue('2');
    await user.clear(ratio);
    expect(concentration).toHaveValue('');
    await user.type(ratio, '3,0');
    expect(ratio).toHaveValue('3,0');
    expect(concentration).toHaveValue('25');
    await user.click(keep());
    expect(onSave).toHaveBeenCalledWith(expect.objectContaining({ waterToLye: 3, method: 'cold', madeOn: '2026-03-14' }));
  });

  it('refuses a concentration that no lye has, and a word where a number belongs, at their fields', async () => {
    const { user, onSave, keep } = show();
    await user.type(screen.getByLabelText('Lye concentration'), '60');
    await user.type(screen.getByLabelText('Bars'), 'twelve');
    await user.type(screen.getByLabelText('Lye at mixing'), '150');
    await user.click(keep());
    expect(onSave).not.toHaveBeenCalled();
    expect(screen.getByLabelText('Lye concentration')).toHaveAccessibleDescription(/between 15 and 50 %/);
    expect(screen.getByLabelText('Bars')).toHaveAccessibleDescription(/Type a number/);
    expect(screen.getByLabelText('Lye at mixing')).toHaveAccessibleDescription(/Lye temperature must lie between 5 and 120 °C/);
    expect(screen.getByLabelText('Bars')).toHaveValue('twelve');
    // The form moves the focus after its fields have said what is wrong.
    await waitFor(() => expect(document.activeElement).toHaveAttribute('aria-invalid', 'true'));
  });

  it('warns while typing, in the person’s units, and still lets pass', async () => {
    const { user, onSave, keep } = show({ units: { temperatureUnit: 'fahrenheit' } });
    await user.type(screen.getByLabelText('Oils at mixing'), '140');
    expect(screen.getByLabelText('Oils at mixing')).toHaveAccessibleDescription(/between 81\s°F and 131\s°F/);
    await user.click(keep());
    expect(onSave).toHaveBeenCalledWith(expect.objectContaining({ oilTemperatureC: 60 }));
  });

  it('shows a lot’s standing in its choice and warns when it is planned in the wrong method', async () => {
    const { user } = show();
    await user.click(screen.getByRole('button', { name: 'Add a line' }));
    await user.selectOptions(screen.getByLabelText('Material'), 'Ember Fig');
    const lots = screen.getByLabelText('Lot');
    expect(within(lots).getByRole('option', { name: 'EF-7802: hot process only' })).toBeInTheDocument();
    await user.selectOptions(lots, LOT);
    expect(lots).toHaveAccessibleDescription('EF-7802 is for hot process only');
    await user.selectOptions(screen.getByLabelText('Method'), 'hot');
    expect(lots).not.toHaveAccessibleDescription(/hot process only/);
  });

  it('asks about the cook of hot batches only, and cautions once', async () => {
    const { user } = show();
    expect(screen.queryByLabelText('Cook time')).toBeNull();
    await user.selectOptions(screen.getByLabelText('Method'), 'hot');
    expect(screen.getByLabelText('Cook time')).toBeInTheDocument();
    expect(screen.getAllByText(/safety data sheet and your local rules come before/)).toHaveLength(1);
    expect(screen.getByText(/Stay with a cooking batch/)).toBeInTheDocument();
  });

  it('puts what the server refuses at its field, says the rest above the blocks, and keeps what was typed', async () => {
    const onSave = vi.fn(async () => {
      throw new CallProblem({ type: '/problems/invalid', title: 'x', status: 422, errors: [{ pointer: '#/code', detail: 'Another batch has this code' }, { pointer: '#/elsewhere', detail: 'The moon is wrong' }] });
    });
    const { user, keep } = show({ onSave });
    await user.type(screen.getByLabelText('Batch code'), 'QL-7');
    await user.click(keep());
    expect(await screen.findByText('Another batch has this code')).toBeInTheDocument();
    expect(screen.getByText('The moon is wrong')).toBeInTheDocument();
    expect(screen.getByLabelText('Batch code')).toHaveValue('QL-7');
  });
});
