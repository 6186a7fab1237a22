// https://nuxt.com/docs/api/configuration/nuxt-config
export default defineNuxtConfig({
  modules: ['@pinia/nuxt', '@nuxtjs/tailwindcss', 'nuxt-auth-utils', '@nuxt/eslint'],

  // Components are named after their folder and file: components/bolt/Pattern.vue is <BoltPattern>.
  components: [{ path: '~/components', pathPrefix: true }],
  imports: { scan: true },
  devtools: { enabled: false },

  app: {
    head: {
      htmlAttrs: { lang: 'en' },
      titleTemplate: '%s · Jamnut',
      meta: [
        { name: 'viewport', content: 'width=device-width, initial-scale=1, viewport-fit=cover' },
        { name: 'color-scheme', content: 'light dark' },
      ],
      link: [{ rel: 'icon', type: 'image/svg+xml', href: '/icon.svg' }],
    },
  },

  css: ['~/assets/css/fonts.css'],

  runtimeConfig: {
    session: { name: 'jamnut', maxAge: 60 * 60 * 12, password: '', cookie: { sameSite: 'lax', secure: false } },
  },
  srcDir: '.',
  serverDir: 'server',
  future: { compatibilityVersion: 4 },

  experimental: {
    appManifest: false,
    defaults: { nuxtLink: { prefetchOn: { visibility: false, interaction: true } } },
  },
  compatibilityDate: '2026-12-01',

  nitro: {
    compressPublicAssets: { gzip: true, brotli: true },
    typescript: { strict: true },
    // Sequelize asks for its driver by a computed name that no tracer sees.
    externals: { traceInclude: ['node_modules/pg/lib/index.js'] },
  },

  vite: {
    $client: {
      build: {
        rollupOptions: {
          output: {
            // Most screens draw with these: one file compresses better than thirty of half a kilobyte.
            manualChunks: id => /\/components\/(bolt|torque\/(BandRule|VerdictBadge|QuantityPair|CertaintyWord)|base\/(States|Field|Checkbox|TextArea|TextInput|Notice|DefinitionRow))|\/shared\/torque\/(units|quantity|verdict)|\/utils\/(format|band-scale|bolt-layout|theme)\./.test(id)
              ? 'drawing'
              : undefined,
          },
        },
      },
    },
  },

  typescript: {
    strict: true,
    tsConfig: {
      compilerOptions: { noUncheckedIndexedAccess: true, noImplicitOverride: true },
      exclude: ['../.data', '../.output', '../node_modules'],
    },
  },
  telemetry: false,

  hooks: {
    // nuxt-auth-utils opens a session endpoint to everybody; ours is /api/auth/me.
    'nitro:config'(config) {
      config.handlers = config.handlers?.filter(handler => !handler?.route?.startsWith('/api/_auth'))
    },
  },

  // The cookie holds only a session id; each route decides for itself whether it needs one.
  auth: { loadStrategy: 'none' },
  eslint: { config: { stylistic: { semi: false, quotes: 'single', braceStyle: '1tbs' }, standalone: true } },
  pinia: { storesDirs: ['./stores/**'] },
  tailwindcss: { cssPath: '~/assets/css/tailwind.css', viewer: false },
})
