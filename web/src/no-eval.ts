/**
 * Runs before every other script. The page's content security policy forbids `eval`, and the schema
 * library would try it once to see; told beforehand, it does not, and the console stays clean.
 */
(globalThis as { __zod_globalConfig?: { jitless: boolean } }).__zod_globalConfig = {
  jitless: true,
};
