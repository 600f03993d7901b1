import path from 'node:path';

const VAGUE = /^(utils?|helpers?|misc|common|constants|types|interfaces)$/;

/** A file is named in small letters after the one idea it holds. */
export const fileNames = {
  meta: {
    type: 'suggestion',
    schema: [],
    messages: {
      vague: '"{{name}}" says nothing about what is inside: name the file after its one idea.',
      letters: '"{{name}}" should be small-letters-with-hyphens.',
    },
  },
  create(context) {
    return {
      Program(node) {
        const name = path.basename(context.filename).replace(/\.[cm]?[jt]s$/, '');
        const [idea = ''] = name.split('.');
        if (VAGUE.test(idea)) context.report({ node, messageId: 'vague', data: { name } });
        else if (!/^[a-z0-9-]+(\.[a-z0-9-]+)*$/.test(name)) {
          context.report({ node, messageId: 'letters', data: { name } });
        }
      },
    };
  },
};
