/** Texts of everything in `stacks/`, by path as seen from here. */
export const DEMO_TEXTS = import.meta.glob<string>('../../../stacks/**/*.{yaml,csv}', {
  query: '?raw',
  import: 'default',
  eager: true,
})
