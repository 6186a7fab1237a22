// @ts-check
import withNuxt from './.nuxt/eslint.config.mjs'

// Imports run one way (type imports included). One block a folder, since a later block replaces an earlier one.
const client = ['components', 'pages', 'composables', 'stores', 'layouts', 'plugins', 'middleware', 'utils']
const noServer = { regex: '(^|/)server(/|$)', message: 'The client never imports the server.' }
const noClient = {
  regex: '(^|/)(components|pages|composables|stores|layouts)(/|$)|^(~|@)/(?!server)|^#(components|app)$',
  message: 'The server never imports the client.',
}
const noFixtures = { regex: '(^|/)(seeds|tests)(/|$)', message: 'Nothing imports seeds or tests.' }
const noHttp = { regex: '^h3$|(^|/)(presenters|api|contract)(/|$)|(^|/)utils/(?!env$|logger$)', message: 'Services know nothing of HTTP or presenters.' }
const onlyShared = {
  regex: '^(?!\\.|zod/|convert-units|dayjs|canonicalize$)|(^|/)(server|seeds|tests)(/|$)|(^|\\.\\./)(components|pages|composables|stores|utils)(/|$)',
  message: 'shared/ imports only itself, zod/mini, convert-units, dayjs and canonicalize.',
}

/**
 * @param {string[]} files
 * @param {{ regex: string, message: string }[]} patterns
 * @returns {import('eslint').Linter.Config}
 */
const arrows = (files, ...patterns) => ({ files, rules: { 'no-restricted-imports': ['error', { patterns }] } })

export default withNuxt(
  {
    rules: {
      'vue/singleline-html-element-content-newline': 'off',
      'vue/max-attributes-per-line': 'off',
    },
  },
  arrows([...client.map(folder => `${folder}/**`), 'app.vue', 'error.vue'], noServer, noFixtures),
  arrows(['server/**'], noClient, noFixtures),
  arrows(['server/services/**'], noClient, noFixtures, noHttp),
  arrows(['shared/**'], onlyShared),
)
