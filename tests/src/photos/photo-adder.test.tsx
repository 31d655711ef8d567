import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { SessionView } from '#shared/session.ts';
import type { Role } from '#shared/words/roles.ts';
import { PhotoAdder } from '#src/features/photos/PhotoAdder.tsx';
import { UploadsProvider } from '#src/features/photos/Uploads.tsx';
import { sessionQuery } from '#src/features/session/session.queries.ts';

/** Stands in for the browser's request: what was sent is looked at, answers are given by hand. */
class FakeRequest extends EventTarget {
  static all: FakeRequest[] = [];
  readonly upload = new EventTarget();
  status = 0;
  responseText = '';
  form = new FormData();
  isAborted = false;
  constructor() {
    super();
    FakeRequest.all.push(this);
  }
  open() {}
  setRequestHeader() {}
  send(form: FormData) {
    this.form = form;
  }
  abort() {
    this.isAborted = true;
    this.dispatchEvent(new Event('abort'));
    this.dispatchEvent(new Event('loadend'));
  }
  progress(loaded: number) {
    act(() => void this.upload.dispatchEvent(new ProgressEvent('progress', { loaded, total: loaded })));
  }
  async answer(status: number, body: unknown) {
    this.status = status;
    this.responseText = JSON.stringify(body);
    await act(async () => {
      this.dispatchEvent(new Event('load'));
      this.dispatchEvent(new Event('loadend'));
    });
  }
}

const session = (role: Role) => ({
  member: { id: 'm1', name: 'Test', role }, account: { id: 'a1', email: 't@test.example', name: 'Test', temperatureUnit: 'celsius', massUnit: 'gram', singleKeys: true },
  workshop: { id: 'w1', name: 'W', timeZone: 'Europe/London', currency: 'EUR', isDemo: false }, workshops: [],
}) as unknown as SessionView;

function show(role: Role = 'inspector') {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false, staleTime: Infinity } } });
  client.setQueryData(sessionQuery.queryKey, session(role));
  return { client, ...render(
    <QueryClientProvider client={client}>
      <UploadsProvider><PhotoAdder batchId="b1" batchCode="T-0001" stage="cut" /></UploadsProvider>
    </QueryClientProvider>,
  ) };
}
const photo = (name: string, bytes = 3 * 1024 * 1024) => new File([new Uint8Array(bytes)], name, { type: 'image/jpeg' });

beforeEach(() => {
  FakeRequest.all = [];
  vi.stubGlobal('XMLHttpRequest', FakeRequest);
  URL.createObjectURL = () => 'blob:x';
  URL.revokeObjectURL = () => undefined;
});
afterEach(() => void vi.unstubAllGlobals());

describe('adding photos', () => {
  it('sends what was chosen with batch, stage and an id of its own, and shows how far it is', async () => {
    const { container } = show();
    await userEvent.upload(container.querySelector<HTMLInputElement>('input[data-photos]') as HTMLInputElement, [photo('end.jpg'), photo('top.jpg')]);
    expect(FakeRequest.all).toHaveLength(2);
    const [first] = FakeRequest.all;
    expect([first?.form.get('batchId'), first?.form.get('stage')]).toEqual(['b1', 'cut']);
    expect(first?.form.get('ids')).toMatch(/^[\da-f]{8}-[\da-f]{4}-7/);
    first?.progress(1024 * 1024);
    expect(screen.getByRole('progressbar', { name: '1.0 of 3.0 MiB sent' })).toBeInTheDocument();
    await first?.answer(200, { items: [{ outcome: 'refused', fileName: 'end.jpg', reason: 'The picture is damaged or did not arrive whole; send it again' }] });
    expect(screen.getByRole('alert')).toHaveTextContent('Not taken. The picture is damaged');
  });

  it('takes dropped photos, and stops one on its way', async () => {
    show();
    fireEvent.drop(screen.getByRole('region', { name: 'Add photos' }), { dataTransfer: { files: [photo('drop.jpg')], types: ['Files'] } });
    await userEvent.click(screen.getByRole('button', { name: 'Stop drop.jpg' }));
    expect(FakeRequest.all[0]?.isAborted).toBe(true);
    expect(screen.queryByText('drop.jpg')).not.toBeInTheDocument();
  });

  it('says in the server’s words why a whole upload was not taken', async () => {
    const { container } = show();
    await userEvent.upload(container.querySelector<HTMLInputElement>('input[data-photos]') as HTMLInputElement, photo('big.jpg'));
    await FakeRequest.all[0]?.answer(413, { type: '/problems/too-large', title: 'Too large', status: 413, detail: 'A photo may weigh at most 25 MiB' });
    expect(screen.getByRole('alert')).toHaveTextContent('A photo may weigh at most 25 MiB');
  });

  it('forgets what is on its way once another person is signed in', async () => {
    const { client, container } = show();
    await userEvent.upload(container.querySelector<HTMLInputElement>('input[data-photos]') as HTMLInputElement, photo('mine.jpg'));
    expect(screen.getByText('mine.jpg')).toBeInTheDocument();
    const other = session('inspector');
    act(() => void client.setQueryData(sessionQuery.queryKey, { ...other, member: { ...other.member, id: 'm2' } }));
    expect(await screen.findByRole('button', { name: 'Choose photos' })).toBeInTheDocument();
    expect(screen.queryByText('mine.jpg')).not.toBeInTheDocument();
    expect(FakeRequest.all[0]?.isAborted).toBe(true);
  });

  it('is not offered to a viewer', () => {
    show('viewer');
    expect(screen.queryByRole('button', { name: 'Choose photos' })).not.toBeInTheDocument();
  });
});
