import { expect, test } from 'vitest'
import { rebaseFiles } from '../../src/stack/rebaseFiles.js'

test('paths of files, film cards and patterns are moved; comments and everything else stay', () => {
  const text = `title: file   # not a path
layers:
  - {id: file, film: films/a.film.yaml, index: {file: "nk.csv"}}   # the card
panel: {reflectance: {file: panel.csv}}
compare: {slots: {half: ["films/half-*.film.yaml", films/x.film.yaml]}}
`
  expect(rebaseFiles(text, (path) => `../${path}`)).toBe(`title: file   # not a path
layers:
  - {id: file, film: ../films/a.film.yaml, index: {file: "../nk.csv"}}   # the card
panel: {reflectance: {file: ../panel.csv}}
compare: {slots: {half: ["../films/half-*.film.yaml", ../films/x.film.yaml]}}
`)
})
