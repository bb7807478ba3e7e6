/** The places in the left navigation, in the order the work flows. Places not built are not listed. */
export const PLACES = [
  { path: '/bench', word: 'Bench', key: 'b' },
  { path: '/programs', word: 'Programs', key: 'p' },
  { path: '/racks', word: 'Rack', key: 'r' },
  { path: '/tools', word: 'Tools', key: 't' },
  { path: '/machines', word: 'Machine', key: 'm' },
  { path: '/change-macro', word: 'Change macro', key: 'c' },
  { path: '/shop', word: 'Shop', key: 's' },
] as const;
