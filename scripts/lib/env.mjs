const ours = /^(JAMNUT_|NUXT_|NITRO_|DATABASE_|HOST$|PORT$|NODE_ENV$)/

const filter = (env, keep) => Object.fromEntries(Object.entries(env).filter(([name]) => keep(name)))

/** An environment without some of its variables. */
export const without = (env, ...names) => filter(env, name => !names.includes(name))

/** An environment without anything that steers Jamnut: a test run decides all of it itself. */
export const withoutOurs = env => filter(env, name => !ours.test(name))
