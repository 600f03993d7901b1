/** jsdom has no layout: observers exist and stay silent. */
class SilentResizeObserver implements ResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}
globalThis.ResizeObserver ??= SilentResizeObserver;

/** Nor media: no query holds, and none changes. */
class SilentMedia extends EventTarget implements MediaQueryList {
  readonly matches = false;
  readonly onchange = null;
  constructor(readonly media: string) {
    super();
  }
  addListener(): void {}
  removeListener(): void {}
}
if (!('matchMedia' in globalThis)) {
  Object.assign(globalThis, { matchMedia: (media: string) => new SilentMedia(media) });
}
