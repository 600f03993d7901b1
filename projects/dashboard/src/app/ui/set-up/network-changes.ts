import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/set-up';
import type { getNetwork } from '#shared/contracts/set-up-help';
import type { Api } from '../../core/api/api';
import { amountToType } from '../parse-amount';
import type { ChangeOf } from './change-of';
import { currencyChoices } from './choices';
import { textOf } from './field';
import { centsOrNull, shareOf, shareOrNull, shareToType } from './read-field';

type Network = OutOf<typeof getNetwork>;

/** Name, currency, first fee, target and claim limit of the network. */
export function networkChange(api: Api, network: Network): ChangeOf<Network> {
  return {
    label: 'The network',
    act: network.feeRate === null ? 'Save the network' : 'Save the changes',
    fields: [
      { key: 'name', label: 'Name of the network', kind: 'text' },
      {
        key: 'currency',
        label: 'Currency',
        kind: 'choice',
        choices: currencyChoices(),
        hint: 'One for the whole network. Changing it converts no amount.',
      },
      {
        key: 'feeRate',
        label: 'Network fee from the start, % of the bill',
        kind: 'percent',
        hint: 'Before tax; 0 where there is none. A later fee has a day of its own.',
      },
      {
        key: 'targetMarginShare',
        label: 'Target margin, %',
        kind: 'percent',
        need: 'optional',
        hint: 'What Quote aims at, unless a branch has its own. Can wait; no finished car moves.',
      },
      {
        key: 'claimLimitCents',
        label: 'A branch decides claims up to',
        kind: 'money',
        need: 'optional',
        hint: 'Above it head office decides. Empty: a branch decides all its claims.',
      },
    ],
    start: {
      name: network.feeRate === null ? '' : network.name,
      currency: network.currency,
      feeRate: shareToType(network.feeRate),
      targetMarginShare: shareToType(network.targetMarginShare),
      claimLimitCents:
        network.claimLimitCents === null ? '' : amountToType(network.claimLimitCents),
    },
    change: (typed) => {
      const feeRate = shareOf(typed, 'feeRate');
      return feeRate === network.feeRate ? undefined : { kind: 'fee', from: null, feeRate };
    },
    save: (typed) =>
      api.call(contract.putNetwork, {
        body: {
          name: textOf(typed, 'name'),
          currency: textOf(typed, 'currency'),
          feeRate: shareOf(typed, 'feeRate'),
          targetMarginShare: shareOrNull(typed, 'targetMarginShare'),
          claimLimitCents: centsOrNull(typed, 'claimLimitCents'),
        },
      }),
  };
}

/** Another network fee from a day on. */
export function feeChange(api: Api, today: string): ChangeOf<OutOf<typeof contract.putFee>> {
  return {
    label: 'A fee from a day on',
    act: 'Save the fee',
    after: 'clear',
    fields: [
      {
        key: 'from',
        label: 'From the day',
        kind: 'date',
        hint: 'Cars finished on that day and after it pay this fee.',
      },
      { key: 'feeRate', label: 'Network fee, % of the bill', kind: 'percent' },
    ],
    start: { from: today },
    change: (typed) => ({
      kind: 'fee',
      from: textOf(typed, 'from'),
      feeRate: shareOf(typed, 'feeRate'),
    }),
    save: (typed) =>
      api.call(contract.putFee, {
        params: { from: textOf(typed, 'from') },
        body: { feeRate: shareOf(typed, 'feeRate') },
      }),
  };
}
