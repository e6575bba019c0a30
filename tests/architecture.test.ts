import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';
import { describe, expect, test } from 'vitest';
import { faultOf, placeOf, rooms } from './tools/house';
import { chainTo, importsIn, importsOf, sourceFiles } from './tools/imports';

const fromTop = (path: string) => fileURLToPath(new URL(`../${path}`, import.meta.url));

describe('the house', () => {
  test.each(['src', 'workers', 'web'])('every file of %s imports only what its place allows', (folder) => {
    const faults = sourceFiles(folder).flatMap((path) =>
      importsOf(path).map(({ specifier }) => faultOf(path, specifier)),
    );
    expect(faults.filter((fault) => fault !== undefined)).toEqual([]);
  });

  test('every file of src lies in a room', () => {
    const strays = sourceFiles('src').filter((path) => placeOf(path) === undefined);
    expect(strays.map((path) => `${path} lies in no room; the rooms are ${rooms.join(', ')}.`)).toEqual([]);
  });

  test('every room has a README that opens with its name', () => {
    const folders = new Set(sourceFiles('src').flatMap((path) => path.match(/^src\/[^/]+(?=\/)/) ?? []));
    const bare = [...folders].filter((folder) => {
      const readme = fromTop(`${folder}/README.md`);
      return !existsSync(readme) || !/^# \S/.test(readFileSync(readme, 'utf8'));
    });
    expect(bare.map((folder) => `${folder} has no README.md that opens with a heading.`)).toEqual([]);
  });

  test('src is compiled without the browser and without Node', () => {
    const { config } = ts.readConfigFile(fromTop('src/tsconfig.json'), (path) => readFileSync(path, 'utf8'));
    const { options } = ts.parseJsonConfigFileContent(config, ts.sys, fromTop('src'));
    expect(options.lib).toEqual(['lib.es2022.d.ts']);
    expect(options.types).toEqual([]);
  });

  test('nothing that runs on the page loads ndarray, which builds code as it runs', () => {
    const chains = sourceFiles('web').map((path) => chainTo('ndarray', path));
    const faults = chains.filter((chain) => chain !== undefined).map((chain) => chain.join(' -> '));
    expect(faults.map((chain) => `${chain} imports ndarray, which only code behind a worker may.`)).toEqual(
      [],
    );
  });

  test('the top level holds no folders but those the project is made of', () => {
    const known = ['src', 'workers', 'web', 'tests', 'node_modules', 'dist', 'test-results'];
    const strays = readdirSync(fromTop(''), { withFileTypes: true })
      .filter((entry) => entry.isDirectory() && !entry.name.startsWith('.') && !known.includes(entry.name))
      .map((entry) => entry.name);
    expect(strays).toEqual([]);
  });
});

describe('the judge of the house', () => {
  test.each([
    ['src/heat/rod.ts', '../numerics/banded'],
    ['src/heat/rod.ts', './grid'],
    ['src/heat/rod.ts', '../errors'],
    ['src/heat/rod.ts', 'ndarray'],
    ['src/study/ladder.ts', '../operating'],
    ['workers/solver.worker.ts', '../src/report'],
    ['workers/terminal/budget.ts', 'node:fs'],
    ['web/App.svelte', 'svelte/reactivity'],
    ['web/plots/plot.ts', 'uplot/dist/uPlot.min.css'],
  ])('lets %s import %s', (path, specifier) => {
    expect(faultOf(path, specifier)).toBeUndefined();
  });

  test.each([
    ['src/heat/rod.ts', '../lens/fit', /heat may import only from errors, numerics, .*cavity and heat\.$/],
    ['src/heat/rod.ts', '../../web/plot', /imports \.\.\/\.\.\/web\/plot, but heat may import only from/],
    ['src/heat/rod.ts', 'node:fs', /imports Node's node:fs, which only workers\/terminal may\.$/],
    ['src/heat/rod.ts', 'fs', /imports Node's fs/],
    ['src/heat/rod.ts', 'svelte', /only the packages ndarray, valibot and @valibot\/to-json-schema\.$/],
    ['src/misc/rod.ts', './grid', /^src\/misc\/rod\.ts lies in no room of the house/],
    ['src/loose.ts', './errors', /lies in no room of the house/],
    ['workers/client.ts', './terminal/budget', /workers may import only from/],
    ['workers/client.ts', '../web/state.svelte', /workers may import only from/],
    [
      'web/App.svelte',
      'ndarray',
      /the package ndarray, but web may import only the packages svelte and uplot\.$/,
    ],
    ['web/App.svelte', '../workers/terminal/serve.mjs', /web may import only from/],
  ])('refuses %s the import of %s in one sentence', (path, specifier, sentence) => {
    expect(faultOf(path, specifier)).toMatch(sentence);
  });

  test('sees every way of importing and knows which of them leave code behind', () => {
    const text = `
      import a, { type B } from './plain';
      import type { C } from './type-only';
      import './side-effect.css';
      export * from './passed-on';
      export type { D } from './passed-on-type';
      const later = () => import('./later');
      let e: import('./inline-type').E;
      new Worker(new URL('./started.worker.ts', import.meta.url));
      import source from './text.md?raw';
      // import './commented-out';
      const text = "import './quoted'";`;
    const found = importsIn(text);
    const kept = ['./plain', './side-effect.css', './passed-on', './later'];
    const erased = ['./type-only', './passed-on-type', './inline-type', './started.worker.ts', './text.md'];
    expect(found.filter((one) => !one.erased).map((one) => one.specifier)).toEqual(kept);
    expect(found.filter((one) => one.erased).map((one) => one.specifier)).toEqual(erased);
  });
});
