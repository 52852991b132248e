/** Base names, the kind of file after a dot allowed: `submit-orbit.ts`, `submit-orbit.test.ts`. */
const KEBAB_CASE = /^\.?[a-z0-9]+(-[a-z0-9]+)*(\.(test|config|d))?\.[a-z]+$/;
/** Expo Router reads meaning from these: `_layout.tsx`, `+html.tsx`, `[orbitId].tsx`. */
const ROUTE = /^(_layout|\+[a-z]+(-[a-z]+)*|\[[a-z][A-Za-z]*\]|[a-z]+(-[a-z]+)*)\.tsx$/;
const MIGRATION = /^(index|\d{8}T\d{4}(-[a-z0-9]+)+)\.ts$/;

module.exports = {
  meta: {
    type: 'suggestion',
    docs: { description: 'File names are kebab-case; routes and migrations have forms of their own.' },
    messages: { wrong: 'The file name {{name}} is not kebab-case.' },
    schema: [],
  },
  create(context) {
    const path = context.filename.slice(context.cwd.length + 1).split('/');
    const name = path.at(-1);
    const form = path[0] === 'app' ? ROUTE : path[0] === 'migrations' ? MIGRATION : KEBAB_CASE;
    return {
      Program(node) {
        if (!form.test(name)) context.report({ node, messageId: 'wrong', data: { name } });
      },
    };
  },
};
