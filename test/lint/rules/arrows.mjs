import { isBuiltin } from 'node:module';
import path from 'node:path';
import { guarded, layers } from './layers.mjs';

/** Where an import leads: a path inside the project (without extension), or a package. */
export function destinationOf(source, file) {
  if (source.startsWith('#')) return { path: withoutExtension(source.slice(1)) };
  if (source.startsWith('.')) {
    return { path: withoutExtension(path.posix.join(path.posix.dirname(file), source)) };
  }
  return { package: source };
}

/** The sentence that a file's import breaks, or undefined when it is allowed. The file's path counts from the project's root. */
export function brokenArrow(source, file, isType) {
  const to = destinationOf(source, file);
  const from = layerOf(file);
  if (to.package !== undefined) {
    return from && refusesPackage(from, to.package) ? from.because : undefined;
  }
  const guard = guarded.find(({ module }) => module === to.path || `${to.path}/index` === module);
  if (guard && !guard.importers.some((folder) => within(withoutExtension(file), folder))) {
    return guard.because;
  }
  if (!from) return undefined;
  const allowed = [from.own, ...from.reaches, ...(isType ? (from.types ?? []) : [])];
  return allowed.some((folder) => within(to.path, folder)) ? undefined : from.because;
}

/** Import arrows of the house: each layer imports only what test/lint/rules/layers.mjs lets it reach, by alias or by relative path. */
export const arrows = {
  meta: { type: 'problem', schema: [], messages: { broken: '{{because}}' } },
  create(context) {
    const file = path.relative(context.cwd, context.filename).split(path.sep).join('/');
    const judge = (node, isType = false) => {
      if (node?.type !== 'Literal' || typeof node.value !== 'string') return;
      const because = brokenArrow(node.value, file, isType);
      if (because) context.report({ node, messageId: 'broken', data: { because } });
    };
    return {
      ImportDeclaration: (node) => judge(node.source, isTypeOnly(node, 'importKind')),
      ExportNamedDeclaration: (node) => judge(node.source, isTypeOnly(node, 'exportKind')),
      ExportAllDeclaration: (node) => judge(node.source),
      ImportExpression: (node) => judge(node.source),
      TSImportType: (node) => judge(node.source ?? node.argument?.literal, true),
      TSExternalModuleReference: (node) => judge(node.expression),
      'CallExpression[callee.name="require"]': (node) => judge(node.arguments[0]),
    };
  },
};

function layerOf(file) {
  for (const layer of layers) {
    const pattern = layer.folder.split('/');
    const own = file.split('/').slice(0, pattern.length);
    const inFolder = file.split('/').length > pattern.length;
    if (layer.files && !layer.files.test(file)) continue;
    if (inFolder && pattern.every((part, at) => part === '*' || part === own[at])) {
      return { ...layer, own: own.join('/') };
    }
  }
  return undefined;
}

function isTypeOnly(node, kind) {
  const { specifiers } = node;
  return (
    node[kind] === 'type' ||
    (specifiers.length > 0 && specifiers.every((specifier) => specifier[kind] === 'type'))
  );
}

function refusesPackage({ onlyPackages, notPackages = [] }, name) {
  const named = (allowed) => name === allowed || name.startsWith(`${allowed}/`);
  if (onlyPackages) return isBuiltin(name) || !onlyPackages.some(named);
  return notPackages.some(named);
}

function within(target, folder) {
  return target === folder || target.startsWith(`${folder}/`);
}

function withoutExtension(target) {
  return target.replace(/\.[cm]?[jt]s$/, '');
}
