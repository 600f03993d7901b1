/**
 * Lints snippets with the project's own configuration, in a process of its own (the configuration is an ES module, which jest
 * cannot load). Reads `[{file, text}]` as JSON from stdin and prints `[[{ruleId, message}]]`. Rules that need types are
 * left out: a snippet belongs to no TypeScript project.
 */
import { ESLint } from 'eslint';
import { text } from 'node:stream/consumers';
import tseslint from 'typescript-eslint';

const snippets = JSON.parse(await text(process.stdin));
const eslint = new ESLint({
  overrideConfig: { files: ['**/*.ts'], ...tseslint.configs.disableTypeChecked },
});
const answers = [];
for (const snippet of snippets) {
  const results = await eslint.lintText(snippet.text, {
    filePath: snippet.file,
    warnIgnored: true,
  });
  answers.push(
    results.flatMap(({ messages }) => messages.map(({ ruleId, message }) => ({ ruleId, message }))),
  );
}
process.stdout.write(JSON.stringify(answers));
