/** Enums are not used: a union of literals is the same in types, JSON and SQL. */
export const enums = {
  selector: 'TSEnumDeclaration',
  message: 'Write a union of literals instead of an enum: it is the same in types, JSON and SQL.',
};

/** Classes are named by their job title. */
export const vagueClasses = {
  selector: 'ClassDeclaration[id.name=/(Service|Manager|Helper|Utils)$/]',
  message: 'Name a class by its job title, without Service, Manager, Helper or Utils.',
};

const CLOCK_OR_CHANCE =
  'The clock and chance are arguments here, so that the same input gives the same answer: take `now` or a random source from the caller.';

/** Reading the clock or drawing chance without an argument; a date made from an argument stays allowed. */
export const clockAndChance = [
  'CallExpression[callee.object.name="Date"][callee.property.name="now"]',
  'NewExpression[callee.name="Date"][arguments.length=0]',
  'CallExpression[callee.name="Date"]',
  'CallExpression[callee.object.name="performance"][callee.property.name="now"]',
  'CallExpression[callee.object.name="process"][callee.property.name="hrtime"]',
  'MemberExpression[object.name="Math"][property.name="random"]',
  'CallExpression[callee.name=/^(randomBytes|randomInt|randomUUID)$/]',
  'CallExpression[callee.property.name=/^(randomBytes|randomInt|randomUUID|getRandomValues)$/]',
].map((selector) => ({ selector, message: CLOCK_OR_CHANCE }));

/** A page reads signals; a stream is turned into one before it gets there. */
export const subscriptions = {
  selector: 'CallExpression[callee.property.name="subscribe"]',
  message: 'A page does not subscribe: read a signal, and keep streams in core.',
};

/**
 * A store's reader of everything is not for a feature about branches' rows. It may write with it, in the commit it queued, add
 * to the audit trail and read the network's own row.
 */
export const storeOpened = [
  {
    selector:
      'MemberExpression[property.name="unscoped"]:not(CallExpression[callee.property.name="write"] *):not(CallExpression[callee.name=/^(recordAudit|readNetwork)$/] > *)',
    message:
      'store.unscoped sees every branch: read with the ScopedDb of the call, or name this feature in test/lint/rules/layers.mjs if it is about the whole network.',
  },
  {
    selector: 'Property[parent.type="ObjectPattern"][key.name="unscoped"]',
    message: 'store.unscoped sees every branch: read with the ScopedDb of the call.',
  },
];

/** The writing connection stays private to db. */
export const writingConnection = {
  selector: 'MemberExpression[object.name="store"][property.name="writing"]',
  message: 'The writing connection stays private to db: write through BranchWriter or a query.',
};
