/** Usual cautions for preparing and etching a grain size section; own words. */
export const grainCautions: readonly string[] = [
  'Etch in the fume hood with goggles and gloves; pour acid into water or alcohol slowly, never the other way round; label what is mixed with date and name.',
  'Nital: make it fresh, never keep it in a tightly closed bottle (gas pressure); above about 5 % nitric acid in ethanol it can explode. It is corrosive and burns.',
  'Picric acid etchants (picral, Vilella): picric acid is explosive when dry. Keep the stock wet, wipe necks and spills, never let it dry out or warm up, keep it off lead and copper; poisonous, stains the skin.',
  'Hydrofluoric acid etchants (Keller, Kroll): deep burns whose pain comes late. Calcium gluconate gel at hand, never alone, no glass.',
  'Perchloric acid electrolytes: explosive with organics, heat or dry residue; only cooled, in a hood that is washed down, never with plastic or bismuth mounts.',
  'Aqua regia and glyceregia give off poisonous gas: make fresh, discard, never cap or store.',
  'The laboratory\'s own safety sheet and the local rules come first.',
]
