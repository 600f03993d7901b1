import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { openDB } from 'idb';
import { letGo, newDevice, notedAhead, photoFile, refusingDevice } from '../../testing/device';
import { Session } from '../session/session';
import type { TypedClaim } from './claim-draft';
import { ClaimDrafts } from './claim-drafts';
import { DeviceStore } from './device-store';
import { PhotoRefused } from './photo-check';

const JOB = { branch: 'HAV', jobRef: '0417' };
const TYPED: TypedClaim = {
  claimRef: 'W-1',
  madeOn: '2026-02-02',
  zone: 'floor',
  side: 'left',
  cause: 'thin_coverage',
  labourMinutes: '45',
  productMl: '',
  cost: '',
  decision: 'open',
  decidedOn: '',
  paidOn: '',
  note: '',
};

/** The product as it starts anew on the same device. */
function opened(personId = 7): ClaimDrafts {
  TestBed.resetTestingModule();
  const session = { person: signal({ id: personId }) };
  TestBed.configureTestingModule({ providers: [{ provide: Session, useValue: session }] });
  return TestBed.inject(ClaimDrafts);
}

describe('ClaimDrafts', () => {
  beforeEach(newDevice);

  it('given a claim being written, has it with its photo after a start anew', async () => {
    const drafts = opened();
    await drafts.change(JOB, { typed: TYPED });
    await drafts.addPhoto(JOB, TYPED, photoFile());
    const later = opened();
    const kept = await later.find(JOB);
    expect(kept?.typed).toEqual(TYPED);
    expect(kept?.photos).toEqual([{ id: expect.any(String) as string, state: 'here' }]);
    expect((await later.photo(JOB, kept!.photos[0]!.id))?.type).toBe('image/png');
  });

  it('given a page gone before what was typed was kept, has it after a start anew', async () => {
    const drafts = opened();
    await drafts.change(JOB, { typed: TYPED });
    letGo(TestBed.inject(DeviceStore));
    void drafts.change(JOB, { typed: { ...TYPED, note: 'wax never reached the far end' } });
    const later = opened();
    expect((await later.find({ ...JOB, jobRef: '0418' }))?.typed).toBeUndefined();
    expect((await later.find(JOB))?.typed.note).toBe('wax never reached the far end');
    expect((await opened().find(JOB))?.typed.note).toBe('wax never reached the far end');
    expect(notedAhead()).toEqual([]);
  });

  it('given a claim taken off the device, leaves no note of it', async () => {
    const drafts = opened();
    void drafts.change(JOB, { typed: TYPED });
    expect(notedAhead()).toHaveLength(1);
    await drafts.forget(JOB);
    expect(notedAhead()).toEqual([]);
    expect(await opened().find(JOB)).toBeUndefined();
  });

  it('given another person on the device, shows them nothing of it', async () => {
    await opened().change(JOB, { typed: TYPED });
    expect(await opened(8).find(JOB)).toBeUndefined();
  });

  it('given a photo before anything was typed, keeps both', async () => {
    const kept = await opened().addPhoto(JOB, TYPED, photoFile());
    expect(kept?.typed).toEqual(TYPED);
  });

  it('given a file that is no photo, refuses it and keeps the claim', async () => {
    const drafts = opened();
    await drafts.change(JOB, { typed: TYPED });
    await expect(drafts.addPhoto(JOB, TYPED, photoFile([1, 2, 3]))).rejects.toThrow(PhotoRefused);
    expect((await drafts.find(JOB))?.photos).toEqual([]);
  });

  it('given it is forgotten, leaves neither claim nor photo', async () => {
    const drafts = opened();
    const kept = await drafts.addPhoto(JOB, TYPED, photoFile());
    await drafts.forget(JOB);
    expect(await drafts.find(JOB)).toBeUndefined();
    expect(await drafts.photo(JOB, kept!.photos[0]!.id)).toBeUndefined();
  });

  it('given a browser that keeps nothing, says so and has it while the page is open', async () => {
    refusingDevice();
    const drafts = opened();
    await drafts.change(JOB, { typed: TYPED });
    expect((await drafts.find(JOB))?.typed).toEqual(TYPED);
    expect(drafts.trouble()).toContain('keeps nothing');
  });

  it('given a device from before claims were kept, keeps them beside the jobs written there', async () => {
    const older = await openDB('underseam', 1, {
      upgrade: (db) =>
        ['drafts', 'photos', 'queue'].forEach((store) => db.createObjectStore(store)),
    });
    await older.put('drafts', { id: 'a' }, 'a');
    older.close();
    const drafts = opened();
    await drafts.change(JOB, { typed: TYPED });
    expect(drafts.trouble()).toBeUndefined();
    expect((await opened().find(JOB))?.typed).toEqual(TYPED);
    const newer = await openDB('underseam', 2);
    expect(await newer.get('drafts', 'a')).toEqual({ id: 'a' });
    newer.close();
  });
});
