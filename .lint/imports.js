import { readdirSync } from 'node:fs';
import path from 'node:path';

/** Rooms of shared/, lowest first: a room imports only rooms before it. */
export const rooms = [
  'units', 'api', 'people', 'geometry', 'hardware', 'patterns', 'walls', 'layouts', 'hanging',
  'findings', 'signoffs', 'stock', 'quotes', 'templates', 'hangday', 'jobs',
];

/** Pure libraries that shared/ may use. */
const pureLibraries = ['zod', 'polygon-clipping', 'ml-matrix', 'rbush', 'flatbush', 'canonicalize', 'immer'];

/** server/ folders that serve every room and know none. */
const serverGround = ['http', 'database', 'files', 'mail', 'payments', 'workers', 'fakes'];

const root = path.dirname(import.meta.dirname);

function place(file) {
  const parts = path.relative(root, file).split(path.sep);
  return { top: parts[0], room: parts.length > 2 ? parts[1] : '', rest: parts.slice(2).join('/'), name: parts.at(-1) ?? '' };
}

/** Why `from` may not import `target` (both absolute), or null where it may. */
export function forbidden(from, target) {
  const a = place(from);
  const b = place(target);
  if (a.top !== 'tests' && a.top !== 'e2e' && b.top === 'tests') return 'nothing imports tests';
  if (a.top === 'e2e' && b.top !== 'e2e' && !b.name.startsWith('printed-')) return 'e2e sees the app from outside';
  if (a.top === 'shared') {
    if (b.top !== 'shared') return 'shared/ imports nothing outside shared/';
    const from_ = rooms.indexOf(a.room);
    const to = rooms.indexOf(b.room);
    if (from_ < 0) return `shared/${a.room} is not a known room: add it to the list in .lint/imports.js`;
    if (to > from_) return `shared/${a.room} stands below shared/${b.room}`;
  }
  if (a.top === 'server') {
    if (b.top === 'src') return 'server/ and src/ never meet';
    const fromGround = serverGround.includes(a.room);
    const toRoom = b.top === 'server' && rooms.includes(b.room);
    if (fromGround && toRoom && !/^(seed|tasks)\//.test(a.rest)) return `server/${a.room} knows no room`;
    if (toRoom && rooms.includes(a.room) && a.room !== b.room && !/\.service\.tsx?$/.test(b.name)) {
      return 'a room enters another only by its service';
    }
  }
  if (a.top === 'src') {
    if (b.top === 'server') return 'server/ and src/ never meet';
    if (['components', 'lib'].includes(a.room) && b.top === 'src' && ['features', 'pages', 'app'].includes(b.room)) {
      return `src/${a.room} knows no feature`;
    }
    if (a.room === 'features' && b.top === 'src') {
      if (['pages', 'app'].includes(b.room)) return 'features know no page';
      if (b.room === 'features' && a.rest.split('/')[0] !== b.rest.split('/')[0]) return 'features are strangers';
    }
  }
  return null;
}

/** Whether a library may be imported from this file. */
function forbiddenLibrary(from, name) {
  const a = place(from);
  if (a.top === 'shared' && !pureLibraries.some((l) => name === l || name.startsWith(`${l}/`))) {
    return `shared/ may import only ${pureLibraries.join(', ')}`;
  }
  if (name === 'typeorm' && a.top === 'server' && a.room !== 'database' && !a.name.endsWith('.repository.ts')) {
    return 'only database/ and repositories import typeorm';
  }
  return null;
}

const rule = {
  meta: { type: 'problem', schema: [], messages: { no: '{{why}}' } },
  create(context) {
    function check(node) {
      const source = node.source?.value;
      if (typeof source !== 'string') return;
      const why = source.startsWith('.')
        ? forbidden(context.filename, path.resolve(path.dirname(context.filename), source))
        : forbiddenLibrary(context.filename, source);
      if (why) context.report({ node, messageId: 'no', data: { why } });
    }
    return { ImportDeclaration: check, ExportNamedDeclaration: check, ExportAllDeclaration: check, ImportExpression: check };
  },
};

const known = readdirSync(root, { withFileTypes: true }).filter((d) => d.isDirectory()).map((d) => d.name);

export const importRules = [
  {
    files: ['src', 'server', 'shared', 'tests', 'e2e'].filter((d) => known.includes(d)).map((d) => `${d}/**/*.{ts,tsx}`),
    plugins: { house: { rules: { imports: rule } } },
    rules: { 'house/imports': 'error' },
  },
];
