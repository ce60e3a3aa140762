import type { StepInSample } from '../../../shared/api/samples.ts'

/** What a step of preparation asks for, in the order it is done. Local work instructions come first. */
export const stepWords: Readonly<Record<StepInSample['kind'], readonly string[]>> = {
  'section': ['Mark where the test pieces lie before cutting, and keep the sample\'s number on every part.', 'Cut with coolant; a cut that turned blue has changed the structure: cut again.', 'Deburr, dry, and mark each test piece with the sample\'s number.'],
  'machine': ['Check the drawing or the standard\'s test piece against what was sent.', 'Machine with light last cuts, so that the surface is neither hardened nor heated.', 'Measure the test length at both ends and the middle, and mark the piece.'],
  'mount': ['Put the face to be seen downwards; keep the sample\'s number with it.', 'Choose a mounting that neither heats the material too much nor leaves a gap at its edge.', 'Engrave the number into the mount.'],
  'grind and polish': ['Go through the papers with water, turning the piece by a quarter each time until the earlier scratches are gone.', 'Rinse, then polish to a finish without scratches at the magnification to be used.', 'Look at it unetched: pull-outs, smearing and rounded edges mean grinding again.'],
  'etch': ['Hood on, goggles and gloves on, the bottle\'s name and date checked.', 'Etch until the boundaries are seen, no longer; rinse with water, then alcohol, and dry.', 'Look at it: too dark is polished and etched again.'],
}

/** Usual cautions of preparation; the laboratory's own rules come first. Etchants have theirs from the method. */
export const stepCautions: Readonly<Record<StepInSample['kind'], readonly string[]>> = {
  'section': ['Guard closed, coolant on, eye protection; let the cut face cool before it is touched.'],
  'machine': ['Chuck key out, sleeves and hair tied, eye protection; chips are sharp and hot.'],
  'mount': ['The press is hot and under pressure: let it cool before it is opened; gloves for resins and hardeners.'],
  'grind and polish': ['Hold the piece so that the wheel pulls it away from you; no loose sleeves or gloves at a turning wheel.'],
}
