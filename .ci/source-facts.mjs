// Reads one TypeScript file into what the layer rules ask of it: its imports and the globals it uses.
import { readFileSync } from 'node:fs';
import { parseSync } from 'vite';

/**
 * @typedef {{ target: string, typeOnly: boolean }} Import
 * @param {string} file path of a .ts or .tsx file
 * @returns {{ imports: Import[], globals: Set<string> }} `globals` has names and, for members, `Math.random`
 */
export function sourceFacts(file) {
  const { program, errors } = parseSync(file, readFileSync(file, 'utf8'));
  if (errors.length > 0) throw new Error(`${file}: ${errors[0].message}`);
  const imports = [];
  const declared = new Set();
  const used = [];
  walk(program, undefined, '', (node, parent, key) => {
    const source = importSource(node);
    if (source !== undefined) imports.push({ target: source, typeOnly: isTypeOnly(node) });
    if (node.type !== 'Identifier') return;
    if (isDeclaration(node, parent, key)) declared.add(node.name);
    else if (isReference(parent, key)) used.push(node.name, ...memberName(node, parent, key));
  });
  return { imports, globals: new Set(used.filter((name) => !declared.has(name.split('.')[0]))) };
}

function walk(node, parent, key, visit) {
  visit(node, parent, key);
  for (const [name, value] of Object.entries(node)) {
    for (const child of Array.isArray(value) ? value : [value]) {
      if (typeof child?.type === 'string') walk(child, node, name, visit);
    }
  }
}

const IMPORTING = new Set([
  'ImportDeclaration',
  'ExportNamedDeclaration',
  'ExportAllDeclaration',
  'ImportExpression',
  'TSImportType',
]);

/** What an import names; a computed name is given as such, for no rule can follow it. */
function importSource(node) {
  if (!IMPORTING.has(node.type) || (node.source ?? null) === null) return undefined;
  return typeof node.source.value === 'string' ? node.source.value : '(computed)';
}

function isTypeOnly(node) {
  if (node.type === 'TSImportType' || node.importKind === 'type' || node.exportKind === 'type') return true;
  const specifiers = node.specifiers ?? [];
  return specifiers.length > 0 && specifiers.every((s) => s.importKind === 'type' || s.exportKind === 'type');
}

const DECLARING = {
  VariableDeclarator: ['id'],
  FunctionDeclaration: ['id', 'params'],
  FunctionExpression: ['id', 'params'],
  ArrowFunctionExpression: ['params'],
  ClassDeclaration: ['id'],
  CatchClause: ['param'],
  ImportSpecifier: ['local', 'imported'],
  ImportDefaultSpecifier: ['local'],
  ImportNamespaceSpecifier: ['local'],
  TSFunctionType: ['params'],
  TSConstructorType: ['params'],
  TSMethodSignature: ['params'],
  TSIndexSignature: ['parameters'],
  TSInterfaceDeclaration: ['id'],
  TSTypeAliasDeclaration: ['id'],
  AssignmentPattern: ['left'],
  RestElement: ['argument'],
  ArrayPattern: ['elements'],
};

function isDeclaration(_node, parent, key) {
  if (parent?.type === 'Property' && key === 'value' && parent.shorthand) return false;
  return DECLARING[parent?.type]?.includes(key) === true;
}

/** Names of members, keys and labels are not uses of a global. */
function isReference(parent, key) {
  if (parent?.type === 'MemberExpression' && key === 'property') return parent.computed;
  if (key === 'key') return parent.computed === true;
  return key !== 'label' && key !== 'exported';
}

function memberName(node, parent, key) {
  if (parent?.type !== 'MemberExpression' || key !== 'object') return [];
  const { property, computed } = parent;
  if (!computed) return [`${node.name}.${property.name}`];
  return property.type === 'Literal' ? [`${node.name}.${property.value}`] : [];
}
