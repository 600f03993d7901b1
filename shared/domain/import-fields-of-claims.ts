import { importField, type ImportField } from './import-field';
import { CLAIM_CAUSES, CLAIM_DECISIONS, SIDES, ZONES } from './vocabulary';

/** What a column of a file of claims may fill. */
export const CLAIM_FIELDS: readonly ImportField[] = [
  importField({
    field: 'claimRef',
    label: 'Claim reference',
    kind: 'reference',
    required: true,
    names: ['claim', 'claim number', 'claim no', 'claim id', 'reference', 'ref'],
  }),
  importField({
    field: 'jobRef',
    label: 'Job reference',
    kind: 'reference',
    required: true,
    names: ['job', 'job number', 'job no', 'job id', 'order', 'order number'],
  }),
  importField({
    field: 'madeOn',
    label: 'Made on',
    kind: 'date',
    required: true,
    names: ['claimed on', 'claim date', 'date of claim', 'date made', 'reported on'],
  }),
  importField({
    field: 'zone',
    label: 'Zone',
    kind: 'choice',
    required: true,
    choices: ZONES,
    names: ['place'],
  }),
  importField({
    field: 'side',
    label: 'Side',
    kind: 'choice',
    choices: SIDES,
    names: ['left or right'],
  }),
  importField({
    field: 'cause',
    label: 'Cause',
    kind: 'choice',
    required: true,
    choices: CLAIM_CAUSES,
    names: ['reason'],
  }),
  importField({
    field: 'decision',
    label: 'Decision',
    kind: 'choice',
    required: true,
    choices: CLAIM_DECISIONS,
    names: ['decided', 'outcome'],
  }),
  importField({
    field: 'decidedOn',
    label: 'Decided on',
    kind: 'date',
    names: ['decision date', 'date decided', 'date of decision'],
  }),
  importField({
    field: 'labourMinutes',
    label: 'Labour minutes',
    kind: 'minutes',
    names: ['labour', 'minutes', 'time'],
  }),
  importField({
    field: 'productMl',
    label: 'Product ml',
    kind: 'whole',
    names: ['ml', 'product', 'millilitres'],
    hint: 'Millilitres of product used, a whole number.',
  }),
  importField({
    field: 'cost',
    label: 'Cost',
    kind: 'amount',
    names: ['cost amount', 'amount'],
    fills: 'costCents',
  }),
  importField({ field: 'costCents', label: 'Cost in minor units', kind: 'cents' }),
  importField({
    field: 'paidOn',
    label: 'Paid on',
    kind: 'date',
    names: ['paid', 'payment date', 'date paid'],
  }),
  importField({
    field: 'note',
    label: 'Note',
    kind: 'text',
    names: ['notes', 'remark', 'comment'],
  }),
];
