import {
  computed,
  DestroyRef,
  DOCUMENT,
  effect,
  inject,
  Injectable,
  signal,
  untracked,
} from '@angular/core';
import { getUsual } from '#shared/contracts/usual';
import { isMonth } from '#shared/domain/calendar';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { DeviceDraft, DraftChange } from '../../core/drafts/device-draft';
import { Drafts } from '../../core/drafts/drafts';
import { Session } from '../../core/session/session';
import { type DraftDocument, valueAt, withValue } from './draft-document';
import { DraftCheck } from './draft-check';
import { SendClock } from './send-clock';
import { SEND_STEPS, type SendStep } from './send-steps';
import { TYPED, type TypedKind } from './typed-values';
import { usualWarnings } from './usual-warnings';

/** Longest that a change waits before it is kept, ms. */
const KEPT_WITHIN = 250;

/** The one draft that is open: what stands in it, every change of it kept on the device at once. Provided by its page. */
@Injectable()
export class OpenDraft {
  private readonly drafts = inject(Drafts);
  private readonly catalogue = inject(Catalogue);
  private readonly clock = inject(SendClock);
  private readonly check = inject(DraftCheck);
  private readonly written = signal<DraftDocument | undefined>(undefined);
  /** Texts that cannot be read, kept in sight beside the content. */
  private readonly unread = signal<ReadonlyMap<string, { text: string; kind: TypedKind }>>(
    new Map(),
  );
  /** The draft as last read from the device or written there: what another window changes since then stays. */
  private taken: DeviceDraft | undefined;
  private waiting: { timer: ReturnType<typeof setTimeout>; change: DraftChange } | undefined;

  readonly id = signal<string | undefined>(undefined);
  /** As the device has it: its state, photos and trouble. */
  readonly kept = computed(() => {
    const id = this.id();
    return this.drafts.list().find((one) => one.id === id);
  });
  /** The device has been asked and has no such draft. */
  readonly isMissing = computed(() => this.drafts.ready() && !this.kept());
  readonly isOpen = computed(() => this.written() !== undefined);
  readonly document = computed<DraftDocument>(() => this.written() ?? {});
  readonly branch = computed(() => this.kept()?.branch ?? '');
  readonly photos = computed(() => this.kept()?.photos ?? []);
  /** Recorders see no money but the price quoted (rule 24). */
  readonly money = computed(() => (this.role() === 'recorder' ? 'hidden' : 'shown'));
  readonly now = this.clock.now;
  /** The field to put the focus on when its step is shown. */
  readonly sought = signal<string | undefined>(undefined);
  private readonly role = inject(Session).role;

  /** What such a car usually takes; nothing without a line. */
  private readonly usualCar = inject(Api).read(getUsual, () => {
    const { vehicle, package: sold } = this.document();
    const { make = '', model = '', bodyType, firstRegistered = '' } = vehicle ?? {};
    if (!make.trim() || !model.trim() || !bodyType || !sold || !isMonth(firstRegistered))
      return undefined;
    if (!this.branch()) return undefined;
    const query = {
      make: make.trim(),
      model: model.trim(),
      firstRegistered,
      bodyType,
      package: sold,
    };
    return { params: { branch: this.branch() }, query };
  });
  readonly usual = computed(() => this.usualCar.value());
  readonly norms = computed(() => {
    const { vehicle, package: sold } = this.document();
    return sold && vehicle?.bodyType ? this.catalogue.normsOf(sold, vehicle.bodyType) : [];
  });
  readonly warnings = computed(() =>
    usualWarnings(this.document(), {
      car: this.usual(),
      norms: this.norms(),
      productName: (code) => this.catalogue.productName(code),
      now: this.now(),
    }),
  );
  /** Every problem there is, whether it is shown at its field yet or not. */
  readonly problems = computed(() => [
    ...[...this.unread()].map(([path, { kind }]) => ({ path, message: TYPED[kind].wrong })),
    ...this.check.problems(this.document(), this.kept()?.problem?.fields ?? [], this.now()),
  ]);
  /** The whole has been looked over: from now on problems stand at their fields. */
  readonly looked = signal(false);

  constructor() {
    effect(() => {
      const kept = this.kept();
      if (!kept || untracked(this.written)) return;
      this.taken = kept;
      this.written.set({ ...kept.content, jobRef: kept.jobRef });
      if (kept.problem) this.looked.set(true);
    });
    const page = inject(DOCUMENT);
    const flush = (): void => void this.flush();
    page.addEventListener('visibilitychange', flush);
    page.defaultView?.addEventListener('pagehide', flush);
    inject(DestroyRef).onDestroy(() => {
      flush();
      page.removeEventListener('visibilitychange', flush);
      page.defaultView?.removeEventListener('pagehide', flush);
    });
  }

  valueAt(path: string): unknown {
    return valueAt(this.document(), path);
  }

  /** What stands in a field: the text that cannot be read, else its value. */
  unreadText(path: string): string | undefined {
    return this.unread().get(path)?.text;
  }

  /** Takes what was typed; a text that cannot be read stays in sight and is not in the content. */
  type(path: string, text: string, kind: TypedKind): void {
    const value = text.trim() === '' ? undefined : TYPED[kind].read(text);
    this.set(path, value);
    const unread = new Map(this.unread());
    if (value === undefined && text.trim() !== '') unread.set(path, { text, kind });
    else unread.delete(path);
    this.unread.set(unread);
  }

  /** Sets a field to a value picked. */
  set(path: string, value: unknown): void {
    this.rewrite((document) => withValue(document, path, value));
  }

  /** Changes the draft as a whole. What it writes over of texts that could not be read is gone. */
  rewrite(change: (document: DraftDocument) => DraftDocument): void {
    const before = this.document();
    const { jobRef = '', ...content } = change(before);
    this.written.set({ ...content, jobRef });
    const unread = [...this.unread()].filter(
      ([path]) => valueAt(before, path) === valueAt(content, path),
    );
    if (unread.length !== this.unread().size) this.unread.set(new Map(unread));
    this.keep({ content, jobRef });
  }

  /** The step stood at, so that the draft opens there again. */
  standAt(step: SendStep): void {
    if (this.kept()?.step !== SEND_STEPS.indexOf(step))
      this.keep({ step: SEND_STEPS.indexOf(step) });
  }

  problemAt(path: string): string | undefined {
    const { wrong } = TYPED[this.unread().get(path)?.kind ?? 'line'];
    if (wrong) return wrong;
    return this.looked() ? this.problems().find((one) => one.path === path)?.message : undefined;
  }

  warningsAt(path: string): readonly string[] {
    return this.warnings().flatMap((one) => (one.path === path ? [one.words] : []));
  }

  /** Keeps what is still waiting to be kept; settles when it is. */
  async flush(): Promise<void> {
    const { waiting } = this;
    const id = this.id();
    if (!waiting || id === undefined) return;
    clearTimeout(waiting.timer);
    this.waiting = undefined;
    // Why it could not be kept stands in the draft's state line.
    const from = this.taken;
    this.taken = from && { ...from, ...waiting.change };
    await this.drafts.change(id, waiting.change, from).catch(() => undefined);
  }

  private keep(change: DraftChange): void {
    // Not begun anew at each change: somebody who writes without a pause would have nothing kept.
    const timer = this.waiting?.timer ?? setTimeout(() => void this.flush(), KEPT_WITHIN);
    this.waiting = { timer, change: { ...this.waiting?.change, ...change } };
  }
}
