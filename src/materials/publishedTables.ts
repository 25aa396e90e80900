import { ag } from './published/ag.js'
import { agJohnson } from './published/agJohnson.js'
import { agLorentzDrude } from './published/agLorentzDrude.js'
import { al } from './published/al.js'
import { alLorentzDrude } from './published/alLorentzDrude.js'
import { alMathewson } from './published/alMathewson.js'
import { calciteNe } from './published/calciteNe.js'
import { calciteNo } from './published/calciteNo.js'
import { cr } from './published/cr.js'
import { crLorentzDrude } from './published/crLorentzDrude.js'
import { cu } from './published/cu.js'
import { cycloOlefin } from './published/cycloOlefin.js'
import { fusedSilica } from './published/fusedSilica.js'
import { glass } from './published/glass.js'
import { glassCrown } from './published/glassCrown.js'
import { ito } from './published/ito.js'
import { itoThin } from './published/itoThin.js'
import { lc5cbNe } from './published/lc5cbNe.js'
import { lc5cbNo } from './published/lc5cbNo.js'
import { lcCyanobiphenylNe } from './published/lcCyanobiphenylNe.js'
import { lcCyanobiphenylNo } from './published/lcCyanobiphenylNo.js'
import { lcNegativeNe } from './published/lcNegativeNe.js'
import { lcNegativeNo } from './published/lcNegativeNo.js'
import { mg } from './published/mg.js'
import { mgf2 } from './published/mgf2.js'
import { mgf2CrystalNe } from './published/mgf2CrystalNe.js'
import { mgf2CrystalNo } from './published/mgf2CrystalNo.js'
import { mo } from './published/mo.js'
import { nb2o5 } from './published/nb2o5.js'
import { pet } from './published/pet.js'
import { pmma } from './published/pmma.js'
import { polycarbonate } from './published/polycarbonate.js'
import { polyimide } from './published/polyimide.js'
import { pva } from './published/pva.js'
import { quartzNe } from './published/quartzNe.js'
import { quartzNo } from './published/quartzNo.js'
import { si3n4 } from './published/si3n4.js'
import { silicon } from './published/silicon.js'
import { siliconAmorphous } from './published/siliconAmorphous.js'
import { sio2Film } from './published/sio2Film.js'
import { tac } from './published/tac.js'
import { ti } from './published/ti.js'
import { tiLorentzDrude } from './published/tiLorentzDrude.js'
import { tio2 } from './published/tio2.js'
import { water } from './published/water.js'
import type { PublishedMaterial } from './publishedMaterial.js'

/**
 * Published figures by the name a stack file uses. The bare name of a metal is the best table over 380 to 780 nm; another source
 * of the same metal carries its first author or its model. Each file names its source, terms and valid range.
 */
export const PUBLISHED: Readonly<Record<string, PublishedMaterial>> = {
  ag,
  ag_johnson: agJohnson,
  ag_lorentz_drude: agLorentzDrude,
  al,
  al_mathewson: alMathewson,
  al_lorentz_drude: alLorentzDrude,
  calcite_ne: calciteNe,
  calcite_no: calciteNo,
  cr,
  cr_lorentz_drude: crLorentzDrude,
  cu,
  cyclo_olefin: cycloOlefin,
  fused_silica: fusedSilica,
  glass,
  glass_crown: glassCrown,
  ito,
  ito_thin: itoThin,
  lc_5cb_ne: lc5cbNe,
  lc_5cb_no: lc5cbNo,
  lc_cyanobiphenyl_ne: lcCyanobiphenylNe,
  lc_cyanobiphenyl_no: lcCyanobiphenylNo,
  lc_negative_ne: lcNegativeNe,
  lc_negative_no: lcNegativeNo,
  mg,
  mgf2,
  mgf2_crystal_ne: mgf2CrystalNe,
  mgf2_crystal_no: mgf2CrystalNo,
  mo,
  nb2o5,
  pet,
  pmma,
  polycarbonate,
  polyimide,
  pva,
  quartz_ne: quartzNe,
  quartz_no: quartzNo,
  si3n4,
  silicon,
  silicon_amorphous: siliconAmorphous,
  sio2_film: sio2Film,
  tac,
  ti,
  ti_lorentz_drude: tiLorentzDrude,
  tio2,
  water,
}
