import { performance } from 'node:perf_hooks';
import { startApp, type RunningApp } from '#tests/support/app.ts';
import { aWorkshop, type World } from '#tests/support/world.ts';
import { manyBatches } from './many-batches.ts';

/** Batches a workshop is filled with; others may be named: `npm run bench -- 180 10000 100000`. */
const SIZES = process.argv.slice(2).map(Number).filter((size) => size > 0);
const REPEATS = 7;

async function median(work: () => Promise<unknown>, repeats = REPEATS): Promise<number> {
  const times: number[] = [];
  for (let turn = 0; turn < repeats; turn += 1) {
    const start = performance.now();
    await work();
    times.push(performance.now() - start);
  }
  return times.sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;
}

/** Asks over HTTP and reads the whole answer; anything but 200 stops the benchmark. */
async function ask(app: RunningApp, world: World, address: string): Promise<void> {
  const answer = await fetch(`${app.url}${address}`, { headers: { Cookie: world.owner.cookie } });
  if (answer.status !== 200) throw new Error(`${address} answered ${answer.status}: ${(await answer.text()).slice(0, 300)}`);
  await answer.arrayBuffer();
}

/** The bare statement that reads the same rows, by the owner's connection: the baseline of each figure. */
const BARE = {
  log: 'select id from batch order by made_on desc, id desc limit 51',
  count: 'select count(*) from batch',
  board: 'select b.id, b.made_on, b.method, b.water_to_lye, b.oil_temperature_c, b.maker_id, o.outcomes from batch b left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id',
};

interface Figure {
  what: string;
  address: string;
  bare: string;
  repeats?: number;
}

const FIGURES: Figure[] = [
  { what: 'log, first page', address: '/api/batches?limit=50', bare: BARE.log },
  { what: 'log, by water', address: '/api/batches?limit=50&sort=water', bare: BARE.log },
  { what: 'log, count', address: '/api/batches/count', bare: BARE.count },
  { what: 'board, first answer', address: '/api/causes', bare: BARE.board, repeats: 1 },
  { what: 'board, asked again', address: '/api/causes', bare: BARE.board },
];

for (const size of SIZES.length > 0 ? SIZES : [180, 10_000]) {
  const app = await startApp();
  try {
    const world = await aWorkshop(app);
    const start = performance.now();
    await manyBatches(world, size);
    console.log(`\n${size} batches, filled in ${((performance.now() - start) / 1000).toFixed(1)} s; median of ${REPEATS}`);
    for (const { what, address, bare, repeats } of FIGURES) {
      const own = await median(() => ask(app, world, address), repeats);
      const baseline = await median(() => world.sql(bare));
      console.log(`  ${what.padEnd(22)} ${own.toFixed(1).padStart(9)} ms   bare SQL ${baseline.toFixed(1).padStart(8)} ms   ratio ${(own / baseline).toFixed(1)}`);
    }
  } finally {
    await app.stop();
  }
}
