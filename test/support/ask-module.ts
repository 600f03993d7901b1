import { execFileSync } from 'node:child_process';
import { pathToFileURL } from 'node:url';

/** Calls a function of an ES module (which jest cannot load) in a process of its own, and answers what it gave, as JSON. */
export function askModule(file: string, name: string, args: readonly unknown[]): unknown {
  const program = `
    const { ${name} } = await import(${JSON.stringify(pathToFileURL(file).href)});
    const answer = await ${name}(...JSON.parse(process.argv[1]));
    process.stdout.write(JSON.stringify(answer ?? null));`;
  const written = execFileSync(
    process.execPath,
    ['--input-type=module', '-e', program, '--', JSON.stringify(args)],
    { encoding: 'utf8' },
  );
  return JSON.parse(written);
}
