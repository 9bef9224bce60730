import type { Role } from '@noonwell/schema';

/** What each demo button lets somebody try, in a sentence. */
export const DEMO_PURPOSES: Readonly<Record<Role, string>> = {
  admin: 'See the whole workspace and set what its members may do.',
  engineer: 'Judge a heat-plus-power receiver upgrade against the present machine.',
  analyst: 'Bring weather years of several sites and run a design on them.',
  student: 'Try designs in a sandbox of your own and read the shared studies.',
};
