import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join, posix, sep } from 'node:path';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';

/** One import in a source file. */
export interface Import {
  /** What stands between the quotes, without a query such as "?raw". */
  specifier: string;
  /** True when the import is gone after compilation or only names a file to be started elsewhere, as a worker is. */
  erased: boolean;
}

const projectRoot = fileURLToPath(new URL('../..', import.meta.url));
const readable = /\.(ts|mjs|svelte)$/;

/**
 * Every file below a folder of the project whose imports can be read.
 * @param folder path from the project's top, "src"
 * @returns paths from the project's top with forward slashes, in order
 */
export function sourceFiles(folder: string): string[] {
  if (!existsSync(join(projectRoot, folder))) return [];
  return readdirSync(join(projectRoot, folder), { recursive: true, encoding: 'utf8' })
    .map((name) => `${folder}/${name.split(sep).join('/')}`)
    .filter((path) => readable.test(path) && statSync(join(projectRoot, path)).isFile())
    .sort();
}

/**
 * What a source file imports, exports on from elsewhere, loads later or starts as a worker.
 * @param path from the project's top
 */
export function importsOf(path: string): Import[] {
  const text = readFileSync(join(projectRoot, path), 'utf8');
  return importsIn(path.endsWith('.svelte') ? scriptsOf(text) : text);
}

/** As `importsOf`, for a text. */
export function importsIn(text: string): Import[] {
  const found: Import[] = [];
  const note = (literal: ts.Node | undefined, erased: boolean) => {
    if (!literal || !ts.isStringLiteralLike(literal)) return;
    const [specifier, query] = literal.text.split('?', 2);
    found.push({ specifier: specifier!, erased: erased || /^(worker|url|raw)\b/.test(query ?? '') });
  };
  const visit = (node: ts.Node): void => {
    if (ts.isImportDeclaration(node)) note(node.moduleSpecifier, node.importClause?.isTypeOnly ?? false);
    else if (ts.isExportDeclaration(node)) note(node.moduleSpecifier, node.isTypeOnly);
    else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument))
      note(node.argument.literal, true);
    else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      note(node.arguments[0], false);
    } else if (ts.isNewExpression(node) && /^(Shared)?Worker$/.test(node.expression.getText(source))) {
      const [address] = node.arguments ?? [];
      // The bundler finds a worker only when its address is written inside the call.
      if (address && ts.isNewExpression(address)) note(address.arguments?.[0], true);
    }
    ts.forEachChild(node, visit);
  };
  const source = ts.createSourceFile('read.ts', text, ts.ScriptTarget.ES2022, false, ts.ScriptKind.TS);
  visit(source);
  return found;
}

/**
 * The path from the project's top that a relative specifier leads to, without asking whether it exists.
 * @returns undefined for a package
 */
export function targetOf(path: string, specifier: string): string | undefined {
  return specifier.startsWith('.') ? posix.normalize(posix.join(posix.dirname(path), specifier)) : undefined;
}

/**
 * The chain of files by which code that runs in the first file comes to load a package.
 * @returns the files in order, the one that imports the package last; undefined when none does
 */
export function chainTo(packageName: string, from: string): string[] | undefined {
  const seen = new Set([from]);
  const waiting = [[from]];
  for (let chain = waiting.shift(); chain; chain = waiting.shift()) {
    const path = chain[chain.length - 1]!;
    for (const { specifier, erased } of importsOf(path)) {
      if (erased) continue;
      if (specifier === packageName || specifier.startsWith(`${packageName}/`)) return chain;
      const next = fileAt(targetOf(path, specifier));
      if (!next || seen.has(next)) continue;
      seen.add(next);
      waiting.push([...chain, next]);
    }
  }
  return undefined;
}

function fileAt(target: string | undefined): string | undefined {
  if (target === undefined) return undefined;
  return [target, `${target}.ts`, `${target}/index.ts`].find((path) => {
    const full = join(projectRoot, path);
    return readable.test(path) && existsSync(full) && statSync(full).isFile();
  });
}

function scriptsOf(component: string): string {
  return [...component.matchAll(/<script\b[^>]*>([\s\S]*?)<\/script>/g)].map((match) => match[1]).join('\n');
}
