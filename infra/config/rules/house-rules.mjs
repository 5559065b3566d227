/**
 * The few rules of this code base that no published plugin holds.
 *
 * @import { Rule } from 'eslint'
 */

/** A switched-off rule says why, after two hyphens: `eslint-disable-next-line no-x -- because …`. @type {Rule.RuleModule} */
const disableNeedsReason = {
  meta: { type: 'problem', schema: [], messages: { reason: 'Say why after " -- ".' } },
  create(context) {
    return {
      Program() {
        for (const comment of context.sourceCode.getAllComments()) {
          const text = comment.value.trim();
          const isDisable = /^eslint-disable(-next-line|-line)?\b/.test(text);
          if (isDisable && !/\s--\s+\S+/.test(text) && comment.loc) {
            context.report({ loc: comment.loc, messageId: 'reason' });
          }
        }
      },
    };
  },
};

/** A skipped or focused test hides the others. @type {Rule.RuleModule} */
const noSkippedTests = {
  meta: { type: 'problem', schema: [], messages: { skipped: 'No skipped, focused or unwritten tests.' } },
  create(context) {
    return {
      MemberExpression(node) {
        const isTestCall = node.object.type === 'Identifier' && ['describe', 'it', 'test'].includes(node.object.name);
        const name = node.property.type === 'Identifier' ? node.property.name : '';
        if (isTestCall && ['skip', 'only', 'todo', 'fails'].includes(name)) {
          context.report({ node, messageId: 'skipped' });
        }
      },
    };
  },
};

const colorNames =
  'slate|gray|zinc|neutral|stone|red|orange|amber|yellow|lime|green|emerald|teal|cyan|sky|blue|indigo|violet|purple|fuchsia|pink|rose';
const rawPalette = new RegExp(`(?:^|[\\s:"'])-?[a-z-]+-(?:${colorNames})-\\d{2,3}\\b`);
const hexColor = /#(?:[0-9a-f]{8}|[0-9a-f]{6}|[0-9a-f]{3,4})\b/i;

/** Colors come from theme tokens, so that a band keeps one color everywhere. @type {Rule.RuleModule} */
const themeColorsOnly = {
  meta: { type: 'problem', schema: [], messages: { raw: 'Use a theme token, not the raw color "{{text}}".' } },
  create(context) {
    /** @param {Rule.Node} node @param {string} text */
    const check = (node, text) => {
      const match = rawPalette.exec(text) ?? hexColor.exec(text);
      if (match) context.report({ node, messageId: 'raw', data: { text: match[0].trim() } });
    };
    return {
      Literal(node) {
        if (typeof node.value === 'string') check(node, node.value);
      },
      TemplateElement(node) {
        check(node, node.value.raw);
      },
    };
  },
};

export const houseRules = {
  rules: {
    'disable-needs-reason': disableNeedsReason,
    'no-skipped-tests': noSkippedTests,
    'theme-colors-only': themeColorsOnly,
  },
};
