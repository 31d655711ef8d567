import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOTS = ['analysis', 'shared', 'server', 'src', 'tests'];

function sources(folder: string): string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => path.posix.join(entry.parentPath.replaceAll(path.sep, '/'), entry.name));
}

/** Every import of a file as a path of the tree, or the package's name. */
function importsOf(file: string): string[] {
  const text = readFileSync(file, 'utf8');
  return [...text.matchAll(/(?:from |import |import\()'([^']+)'/g)].map(([, target = '']) => {
    if (target.startsWith('#')) return target.slice(1);
    if (target.startsWith('.')) return path.posix.join(path.posix.dirname(file), target);
    return `package:${target}`;
  });
}

const files = ROOTS.flatMap(sources);
const edges = files.flatMap((file) => importsOf(file).map((target) => ({ file, target })));
const broken = (when: (edge: { file: string; target: string }) => boolean) => edges.filter(when).map(({ file, target }) => `${file} -> ${target}`);
const featureOf = (file: string) => /^(?:server|src)\/features\/([^/]+)/.exec(file)?.[1];

describe('who may import whom', () => {
  it('reads enough files to mean something', () => {
    expect(files.length).toBeGreaterThan(40);
    expect(edges.length).toBeGreaterThan(100);
  });

  it('keeps analysis pure', () => {
    const allowed = /^analysis\/|^package:(?:simple-statistics|@stdlib\/stats-base-dists-[a-z-]+|ml-matrix)$/;
    expect(broken(({ file, target }) => file.startsWith('analysis/') && !allowed.test(target))).toEqual([]);
    const impure = files.filter((file) => file.startsWith('analysis/') && /Date\.now|Math\.random|new Date\(\)/.test(readFileSync(file, 'utf8')));
    expect(impure).toEqual([]);
  });

  it('keeps the contract free of everything but zod', () => {
    expect(broken(({ file, target }) => file.startsWith('shared/') && !/^shared\/|^package:zod$/.test(target))).toEqual([]);
  });

  it('keeps client and server apart', () => {
    expect(broken(({ file, target }) => file.startsWith('src/') && /^(?:server|tests)\//.test(target))).toEqual([]);
    expect(broken(({ file, target }) => file.startsWith('server/') && /^(?:src|tests)\//.test(target))).toEqual([]);
  });

  it('lets a server feature see of another only what it reads', () => {
    expect(broken(({ file, target }) => {
      const [own, other] = [featureOf(file), featureOf(target)];
      return file.startsWith('server/') && own !== undefined && other !== undefined && own !== other && !target.endsWith('.read.ts') && !/\/catalogue(?:\/|\.ts)|\/checklist\.ts|\/plan\.ts/.test(target);
    })).toEqual([]);
    const ground = /^server\/(?:http|db|jobs|mail|storage)\//;
    expect(broken(({ file, target }) => ground.test(file) && target.startsWith('server/features/'))).toEqual([]);
    expect(broken(({ file, target }) => file.startsWith('server/db/') && target.startsWith('server/http/'))).toEqual([]);
  });

  it('lets a client feature see of another only its queries', () => {
    expect(broken(({ file, target }) => {
      const [own, other] = [featureOf(file), featureOf(target)];
      return file.startsWith('src/features/') && (target.startsWith('src/app/') || (other !== undefined && own !== other && !target.endsWith('.queries.ts')));
    })).toEqual([]);
    expect(broken(({ file, target }) => file.startsWith('src/components/') && /^src\/(?:features|app)\//.test(target))).toEqual([]);
    expect(broken(({ file, target }) => file.startsWith('src/lib/') && /^src\/(?:components|features|app)\//.test(target))).toEqual([]);
  });

  it('has no barrel files', () => {
    expect(files.filter((file) => /\/index\.tsx?$/.test(file) && !file.startsWith('server/db/migrations/'))).toEqual([]);
  });
});

describe('how large a file may grow', () => {
  it('stays under 400 lines, and 95 of 100 under 200', () => {
    const lengths = files.filter((file) => !file.startsWith('tests/')).map((file) => ({ file, lines: readFileSync(file, 'utf8').split('\n').length }));
    expect(lengths.filter(({ lines }) => lines > 400)).toEqual([]);
    const small = lengths.filter(({ lines }) => lines <= 200).length;
    expect(small / lengths.length).toBeGreaterThanOrEqual(0.95);
  });
});
