import type { OutOf } from '#shared/contracts/endpoint';
import { addKey } from '#shared/contracts/push-keys';
import * as contract from '#shared/contracts/set-up';
import type { Api } from '../../core/api/api';
import type { ChangeOf } from './change-of';
import { ownTimeZone, rowChoices, timeZoneChoices } from './choices';
import { type Field, textOf, type Typed } from './field';
import { centsOf, shareOrNull, shareToType } from './read-field';

/** A branch as the catalogue has it. */
export type Branch = OutOf<typeof contract.putBranch>;

/** What a branch's form is built from besides the branch. */
export interface BranchSurroundings {
  readonly regions: readonly { readonly code: string; readonly name: string }[];
  /** Codes of the branches there are. */
  readonly taken: readonly string[];
}

/** A branch's facts; without one, a new branch. */
export function branchChange(
  api: Api,
  { regions, taken }: BranchSurroundings,
  branch?: Branch,
): ChangeOf<Branch> {
  const only = regions.length === 1 ? regions[0]?.code : undefined;
  return {
    label: branch ? `Branch ${branch.name}` : 'A new branch',
    act: branch ? 'Save the branch' : 'Add the branch',
    fields: [...(branch ? [] : [codeField(taken)]), ...branchFields(regions, branch)],
    check: (typed): Readonly<Record<string, string>> => {
      const closedOn = textOf(typed, 'closedOn');
      return closedOn !== '' && closedOn < textOf(typed, 'openedOn')
        ? { closedOn: 'A branch closes after it opened.' }
        : {};
    },
    start: {
      name: branch?.name ?? '',
      region: branch?.region ?? only ?? '',
      timeZone: branch?.timeZone ?? ownTimeZone(),
      openedOn: branch?.openedOn ?? '',
      closedOn: branch?.closedOn ?? '',
      targetMarginShare: shareToType(branch?.targetMarginShare),
    },
    ...(branch
      ? {
          change: (typed: Typed) => {
            const region = textOf(typed, 'region');
            return region === branch.region
              ? undefined
              : { kind: 'branchRegion' as const, branch: branch.code, region };
          },
        }
      : {}),
    save: (typed) =>
      api.call(contract.putBranch, {
        params: { code: branch?.code ?? textOf(typed, 'code') },
        body: {
          name: textOf(typed, 'name'),
          region: textOf(typed, 'region'),
          timeZone: textOf(typed, 'timeZone'),
          openedOn: textOf(typed, 'openedOn'),
          closedOn: textOf(typed, 'closedOn') || null,
          targetMarginShare: shareOrNull(typed, 'targetMarginShare'),
        },
      }),
  };
}

function codeField(taken: readonly string[]): Field {
  return {
    key: 'code',
    label: 'Code',
    kind: 'code',
    taken,
    hint: '2 to 12 capital letters or digits. It cannot be changed later.',
  };
}

function branchFields(
  regions: BranchSurroundings['regions'],
  branch: Branch | undefined,
): readonly Field[] {
  return [
    { key: 'name', label: 'Name of the branch', kind: 'text' },
    { key: 'region', label: 'Region', kind: 'choice', choices: rowChoices(regions) },
    {
      key: 'timeZone',
      label: 'Time zone',
      kind: 'choice',
      choices: timeZoneChoices(branch?.timeZone ?? ownTimeZone()),
      hint: 'Tells which day it is there, so that no car is finished tomorrow.',
    },
    { key: 'openedOn', label: 'Opened on', kind: 'date' },
    {
      key: 'closedOn',
      label: 'Closed on',
      kind: 'date',
      need: 'optional',
      hint: 'Empty while it is open. Its cars stay in every figure.',
    },
    {
      key: 'targetMarginShare',
      label: 'Target margin of its own, %',
      kind: 'percent',
      need: 'optional',
      hint: 'Empty: the target of the network.',
    },
  ];
}

/** What an hour of work costs a branch, from a day on; the day offered first is the caller's. */
export function rateChange(
  api: Api,
  branch: string,
  from: string,
): ChangeOf<OutOf<typeof contract.putRate>> {
  return {
    label: 'Hourly cost from a day on',
    act: 'Save the hourly cost',
    after: 'clear',
    fields: [
      {
        key: 'from',
        label: 'From the day',
        kind: 'date',
        hint: 'Cars finished on that day and after it are counted at this cost.',
      },
      {
        key: 'hourlyCostCents',
        label: 'Cost of an hour of work',
        kind: 'money',
        hint: 'Wages and what comes with them, not what the owner is asked for.',
      },
    ],
    start: { from },
    change: (typed) => ({
      kind: 'rate',
      branch,
      from: textOf(typed, 'from'),
      hourlyCostCents: centsOf(typed, 'hourlyCostCents'),
    }),
    save: (typed) =>
      api.call(contract.putRate, {
        params: { code: branch, from: textOf(typed, 'from') },
        body: { hourlyCostCents: centsOf(typed, 'hourlyCostCents') },
      }),
  };
}

/** A key with which a branch's own system may send its jobs. */
export function keyChange(api: Api, branch: string): ChangeOf<OutOf<typeof addKey>> {
  return {
    label: 'A new push key',
    act: 'Make a key',
    after: 'clear',
    fields: [
      {
        key: 'label',
        label: 'What the key is for',
        kind: 'text',
        hint: 'For example the system that will use it.',
      },
    ],
    start: {},
    save: (typed) =>
      api.call(addKey, { params: { branch }, body: { label: textOf(typed, 'label') } }),
  };
}
