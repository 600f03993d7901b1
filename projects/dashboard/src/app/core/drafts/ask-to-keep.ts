const KEY = 'underseam.asked-to-keep';

/** Asks the browser once not to clear away what is kept here when the device runs short of room (W3C Storage, persist). */
export function askToKeep(): void {
  try {
    if (localStorage.getItem(KEY)) return;
    localStorage.setItem(KEY, new Date().toISOString());
    // Browsers without it, and pages not served over TLS, have no such question; a refusal changes nothing.
    const storage = navigator.storage as Partial<StorageManager> | undefined;
    void storage?.persist?.().catch(() => false);
  } catch {
    // Storage is switched off.
  }
}
