const DISABLE = /^\s*(eslint-disable(-next-line|-line)?|@ts-(expect-error|ignore|nocheck))\b(?<rest>[\s\S]*)$/;
const REASON = /\s--\s+\S.{9}/;

module.exports = {
  meta: {
    type: 'suggestion',
    docs: { description: 'Whoever switches a rule off says why on the same line, after " -- ".' },
    messages: { bare: 'Say why the rule is switched off: add " -- reason" to this comment.' },
    schema: [],
  },
  create(context) {
    return {
      Program() {
        for (const comment of context.sourceCode.getAllComments()) {
          const found = DISABLE.exec(comment.value);
          if (found && !REASON.test(found.groups.rest)) context.report({ loc: comment.loc, messageId: 'bare' });
        }
      },
    };
  },
};
