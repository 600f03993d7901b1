import './start-demo';

/** After the last journey: the demo network goes, and its folder with it. */
export default async function stopDemo(): Promise<void> {
  await globalThis.journeysDemo?.stop();
}
