import { findMaterial, MATERIAL_NAMES, type Material, materialIndexAt } from '../../materials/material.js'
import { jsonText } from '../../report/jsonText.js'
import { textTable } from '../../report/textTable.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'

const SAMPLE_NM = Float64Array.of(550)

export async function run({ options, terminal }: Context): Promise<ExitCode> {
  const materials = MATERIAL_NAMES.map(findMaterial).filter((material) => material !== undefined)
  terminal.print(options.json ? jsonText({ materials: materials.map(jsonOf) }) : `${tableOf(materials)}\n`)
  return EXIT.done
}

function indexAt550(name: string): { n: number; k: number } {
  const { n, k } = materialIndexAt(name, SAMPLE_NM)
  return { n: n[0], k: k[0] }
}

function jsonOf({ name, title, rangeNm, source, via, note }: Material) {
  return { name, title, range_nm: rangeNm, at_550_nm: indexAt550(name), source, via, note }
}

function tableOf(materials: readonly Material[]): string {
  const columns = [
    { heading: 'name', align: 'left' },
    { heading: 'n', align: 'right' },
    { heading: 'k (550 nm)', align: 'right' },
    { heading: 'from nm', align: 'right' },
    { heading: 'to nm', align: 'right' },
    { heading: 'material', align: 'left' },
    { heading: 'source', align: 'left' },
  ] as const
  const rows = materials.map(({ name, title, rangeNm: [from, to], source }) => {
    const { n, k } = indexAt550(name)
    const extinction = k === 0 ? '0' : k < 0.001 ? k.toExponential(1) : k.toFixed(3)
    return [name, n.toFixed(3), extinction, from.toFixed(0), to.toFixed(0), title, source]
  })
  return textTable(columns, rows)
}
