/**
 * The verbs: name, what it answers, options, an example that runs from the project's folder, and the module that does it,
 * loaded only when asked for, so that `--help` is quick.
 */
import { Option } from 'commander'
import { REVIEW_PARTS } from '../studies/reviewParts.js'
import { angleOption } from './angleOption.js'
import type { VerbModule } from './context.js'
import { directionOptions } from './directionOptions.js'
import { collected, collectedAs, namesAmong, quantityBetween, wholeNumber } from './optionValues.js'

export interface Verb {
  readonly name: string
  readonly summary: string
  /** Takes a stack file, and with it the options that all such verbs share; `new` takes the file to be made, `tune` a folder as well. */
  readonly file?: 'stack' | 'new' | 'folder'
  readonly options?: readonly Option[]
  /** Arguments of `offblack`. */
  readonly example: string
  readonly load: () => Promise<VerbModule<never>>
}

export const VERBS: readonly Verb[] = [
  {
    name: 'evaluate',
    summary: 'how dark, how neutral, at what cost?',
    file: 'stack',
    example: 'evaluate stacks/dive-computer.stack.yaml --set quarter.retardance=138nm',
    load: () => import('./verbs/evaluate.js'),
  },
  {
    name: 'optimize',
    summary: 'which angles and retardances make it darkest?',
    file: 'stack',
    options: [
      new Option('--seed <number>', 'of the starts; the same seed gives the same digits')
        .argParser(wholeNumber(0, 2 ** 31 - 1))
        .default(1),
    ],
    example: 'optimize stacks/dive-computer.stack.yaml --out out',
    load: () => import('./verbs/optimize.js'),
  },
  {
    name: 'sweep',
    summary: 'how does it move along one parameter or two?',
    file: 'stack',
    options: [
      new Option(
        '--vary <range>',
        'path=from:to:step, with parameters that follow behind commas; once or twice; theta, phi and wavelength too',
      )
        .argParser(collected)
        .makeOptionMandatory(),
      new Option('--metric <name>', 'a metric, e.g. chroma or chroma@45deg,90deg; may be repeated').argParser(
        collected,
      ),
      ...directionOptions(),
      new Option('--band <length>', 'width of the band around a varied wavelength')
        .argParser(quantityBetween('length', 0.01, 400))
        .default(10, '10nm'),
    ],
    example:
      'sweep stacks/dive-computer.stack.yaml --vary half.slow_axis=15deg:25deg:1deg,quarter.slow_axis=half.slow_axis+67.5',
    load: () => import('./verbs/sweep.js'),
  },
  {
    name: 'cone',
    summary: 'how does it look from every direction?',
    file: 'stack',
    options: [
      angleOption('--theta-max <angle>', 'widest angle from the normal', 1, 89, 80),
      angleOption('--theta-step <angle>', 'between rings', 0.5, 45, 5),
      angleOption('--phi-step <angle>', 'between azimuths, which divide the circle evenly', 0.5, 90, 10),
      new Option('--limit <share>', 'luminous reflectance that is dark enough; default that of the file').argParser(
        quantityBetween('share', 0, 1),
      ),
    ],
    example: 'cone stacks/dive-computer.stack.yaml --theta-max 70deg --out out',
    load: () => import('./verbs/cone.js'),
  },
  {
    name: 'budget',
    summary: 'where does the remaining light come from?',
    file: 'stack',
    options: directionOptions(),
    example: 'budget stacks/dive-computer.stack.yaml --theta 30deg --phi 90deg',
    load: () => import('./verbs/budget.js'),
  },
  {
    name: 'itinerary',
    summary: 'what happens to the light on its way?',
    file: 'stack',
    options: [
      new Option('--wavelength <length>', 'may be repeated; default 450, 550 and 650 nm').argParser(
        collectedAs(quantityBetween('length', 200, 2500)),
      ),
      ...directionOptions(),
    ],
    example: 'itinerary stacks/dive-computer.stack.yaml --wavelength 550nm',
    load: () => import('./verbs/itinerary.js'),
  },
  {
    name: 'eyewear',
    summary: 'what do polarized sunglasses leave of the lit screen?',
    file: 'stack',
    options: [
      ...directionOptions(),
      angleOption('--roll-step <angle>', 'between rolls of the lens, which divide half a turn evenly', 0.5, 90, 5),
      new Option('--lens-leakage <share>', 'transmittance of the lens across its axis over that along it')
        .argParser(quantityBetween('share', 0, 1))
        .default(0),
    ],
    example: 'eyewear stacks/regatta-watch.stack.yaml',
    load: () => import('./verbs/eyewear.js'),
  },
  {
    name: 'tolerance',
    summary: 'how much of production passes, and what to tighten?',
    file: 'stack',
    options: [
      new Option('--samples <number>', 'laminates drawn, instead of those of the file').argParser(wholeNumber(1, 1e8)),
      new Option('--seed <number>', 'of the draws, instead of that of the file').argParser(wholeNumber(0, 2 ** 32 - 1)),
      new Option('--sampling <name>', 'instead of that of the file').choices(['random', 'latin_hypercube', 'sobol']),
      new Option('--wanted-yield <share>', 'below it the exit code is 3 and the tightening is told')
        .argParser(quantityBetween('share', 0.01, 0.999_999))
        .default(0.95, '95 %'),
      new Option('--draws-only', 'neither sensitivity nor what to tighten').default(false),
    ],
    example: 'tolerance stacks/dive-computer.stack.yaml --samples 500',
    load: () => import('./verbs/tolerance.js'),
  },
  {
    name: 'compare',
    summary: 'which film to buy? Every combination of the film cards, ranked',
    file: 'stack',
    options: [
      new Option('--seed <number>', 'of the searches').argParser(wholeNumber(0, 2 ** 31 - 1)).default(1),
      new Option('--keep <number>', 'how many of the best must each be searched by itself')
        .argParser(wholeNumber(1, 1e6))
        .default(20),
      new Option('--exhaustive', 'search every candidate by itself, rule none out').default(false),
      new Option(
        '--front <axis>',
        'an axis of the front: objective, price_per_m2, thickness_nm or a metric such as chroma@45deg,90deg; repeatable',
      ).argParser(collected),
    ],
    example: 'compare stacks/dive-computer.stack.yaml --out out',
    load: () => import('./verbs/compare.js'),
  },
  {
    name: 'fit',
    summary: 'which layer went wrong? Parameters of a measured sample',
    file: 'stack',
    options: [
      new Option('--measured <csv>', 'spectra of the sample').makeOptionMandatory(),
      new Option('--seed <number>', 'of the starts').argParser(wholeNumber(0, 2 ** 31 - 1)).default(1),
    ],
    example: 'fit stacks/dive-computer.stack.yaml --measured stacks/measured/dive-computer-prototype-a.csv',
    load: () => import('./verbs/fit.js'),
  },
  {
    name: 'tune',
    summary: 'turn the films by hand, on a local page',
    file: 'folder',
    options: [
      new Option('--port <number>', 'to listen on, on this machine only; 0 takes a free one')
        .argParser(wholeNumber(0, 65_535))
        .default(0),
      new Option('--quiet', 'print the address alone'),
    ],
    example: 'tune stacks',
    load: () => import('./verbs/tune.js'),
  },
  {
    name: 'report',
    summary: 'the design review: one HTML page and its PDF, with all the figures',
    file: 'stack',
    options: [
      new Option('--sections <names>', `parts that take time, separated by commas: ${REVIEW_PARTS.join(', ')}`)
        .argParser(namesAmong(REVIEW_PARTS))
        .default(
          REVIEW_PARTS.filter((part) => part !== 'compare'),
          'all but compare',
        ),
      new Option('--seed <number>', 'of the search; the same seed gives the same digits')
        .argParser(wholeNumber(0, 2 ** 31 - 1))
        .default(1),
    ],
    example: 'report stacks/dive-computer.stack.yaml --sections cone,budget --out out',
    load: () => import('./verbs/report.js'),
  },
  {
    name: 'check',
    summary: 'is the stack file right? All problems at once',
    file: 'stack',
    example: 'check stacks/dive-computer.stack.yaml',
    load: () => import('./verbs/check.js'),
  },
  {
    name: 'new',
    summary: 'start a stack file, with comments',
    file: 'new',
    example: 'new my.stack.yaml',
    load: () => import('./verbs/new.js'),
  },
  {
    name: 'materials',
    summary: 'the published materials, with range and source',
    options: [new Option('--json', 'print JSON')],
    example: 'materials',
    load: () => import('./verbs/materials.js'),
  },
  {
    name: 'schema',
    summary: 'JSON Schema of the stack file, for editors',
    options: [new Option('--film', 'of a film card instead')],
    example: 'schema > stack.schema.json',
    load: () => import('./verbs/schema.js'),
  },
]
