/** Fields of the Quick check: label, and what the word means. */
export const quickCheckFieldTexts = {
  depth: {
    label: 'Depth of water',
    tip: 'Height of the water above the ground, at the wet side of the tube. Drag the water in the drawing, or type.',
  },
  level: {
    label: 'Water level',
    tip: 'Level of the water above the datum. Depth is always level less ground.',
  },
  stage: {
    label: 'Gauge reading',
    tip: 'Stage: what the gauge shows, measured from its own zero.',
  },
  gaugeZero: {
    label: 'Gauge zero',
    tip: 'Level of the zero mark of the gauge above the datum.',
  },
  gaugeCorrection: {
    label: 'Correction to site',
    tip: 'What the water stands higher (+) or lower (−) here than at the gauge.',
  },
  groundLevel: {
    label: 'Ground level here',
    tip: 'Level of the ground under the barrier, above the same datum as the water.',
  },
  uncertainty: {
    label: 'Give or take ±',
    tip: 'How far the forecast may be off, either way. It gives a low, an expected and a high mark, each with its verdict.',
  },
  waterNow: {
    label: 'Water now',
    tip: 'Where the water stands at this moment, entered in the same way as the water that is checked. Once it has reached the leave level the answer is: leave now. Optional.',
  },
  dryDepth: {
    label: 'Water standing here',
    tip: 'Depth of water on the dry side. It lifts the barrier and takes away friction: 10 cm can undo a barrier.',
  },
  currentSpeed: {
    label: 'Current to barrier',
    tip: 'Speed of the water straight towards the barrier. Water along it gives no thrust.',
  },
  dragCoefficient: {
    label: 'Drag coefficient',
    tip: 'How hard the current presses. 2.0 for a long line; less only for a short obstacle.',
  },
  waveHeight: {
    label: 'Wave height',
    tip: 'Significant wave height: mean of the highest third, crest to trough. 0.10 m adds more than half to the thrust of 0.55 m of water.',
  },
  wavePeriod: {
    label: 'Wave period',
    tip: 'Seconds from crest to crest. Needed as soon as there are waves.',
  },
  debrisForce: {
    label: 'Debris force',
    tip: 'Push of floating debris on one section. Published methods differ 75-fold: choose it with care.',
  },
  draught: {
    label: 'Debris draught',
    tip: 'Depth from which floating debris can reach the barrier at all.',
  },
  density: { label: 'Density of water', tip: 'Fresh water 1000, sea water about 1025 kg/m³.' },
  gravity: {
    label: 'Gravity, m/s²',
    tip: 'Acceleration of gravity. 9.81 unless a code says otherwise.',
  },
  rateOfRise: {
    label: 'Rate of rise',
    tip: 'How fast the water comes up. Left empty, everybody leaves 0.05 m below the level that is safe.',
  },
  clearTime: {
    label: 'Time to clear',
    tip: 'Time in which everybody is out of the area, once told to leave.',
  },
  diameter: { label: 'Diameter', tip: 'Of the tube, filled and without water.' },
  skirtLength: {
    label: 'Skirt',
    tip: 'Flat sheet on the wet side, from the weld line to its edge. The water that stands on it keeps the tube in place.',
  },
  contactWidth: {
    label: 'Strip on ground',
    tip: 'Width on which the tube rests before the water comes.',
  },
  mass: { label: 'Mass', tip: 'Tube and skirt together, for each metre of line.' },
  airPressure: {
    label: 'Air pressure',
    tip: 'Above the pressure of the air outside. It stiffens the tube; it does not make it heavier.',
  },
  sectionLength: {
    label: 'Section length',
    tip: 'Length of one tube from joint to joint.',
  },
  fabricStrength: {
    label: 'Fabric strength',
    tip: 'Tensile strength of the fabric per metre of width, seams and age taken off. Empty: the fabric is not checked.',
  },
  statedHeight: {
    label: 'Stated height',
    tip: 'The height printed on the bag. It is not the depth of water that the barrier defends.',
  },
  requiredFreeboard: {
    label: 'Freeboard required',
    tip: 'Freeboard: height of the loaded crest above the water. 0.10 m is common practice.',
  },
  friction: {
    label: 'Friction',
    tip: 'Friction coefficient of the wet skirt on this surface: resistance over weight.',
  },
  fall: {
    label: 'Crossfall',
    tip: 'Slope of the ground across the line. Positive where it falls to the dry side, which helps the water.',
  },
  permeability: {
    label: 'Permeability',
    tip: 'How fast water passes through the ground. Empty: seepage is not computed.',
  },
  layerThickness: {
    label: 'Pervious layer',
    tip: 'Thickness of the layer that lets water through.',
  },
  edgeFactor: {
    label: 'Skirt edge',
    tip: 'How much of the water pressure gets under the wet edge of the skirt: 0 % sealed, 100 % open. No published figure exists for such skirts; open is the safe assumption.',
  },
  weighedEdge: {
    label: 'A weighed edge counts as',
    tip: 'How much of the water pressure gets under an edge that is weighed down with bags. 50 % is judgement, unverified: no published figure exists.',
  },
  edgeWeight: {
    label: 'Weight on that edge',
    tip: 'Bags on the wet edge of the skirt that make it a weighed edge. 2 bags of 20 kg per metre are judgement, unverified.',
  },
  undrainedStrength: {
    label: 'Soft ground, c_u',
    tip: 'Undrained shear strength of clay or silt. Then it bears no more than its strength times the base, and 0.4 of the weight on it (EN 1997-1, 6.5.3, from memory). Empty: friction alone.',
  },
  diffusivity: {
    label: 'Diffusivity',
    tip: 'How fast pressure spreads under the skirt. Large in sand, small in clay.',
  },
  upliftTime: {
    label: 'Water there since',
    tip: 'Time since the water reached the barrier; the pressure under the skirt grows with it.',
  },
  windSpeed: { label: 'Wind over the water', tip: 'Mean wind speed 10 m above the water.' },
  fetch: { label: 'Fetch', tip: 'Length of open water upwind of the barrier.' },
  fetchDepth: { label: 'Depth of the fetch', tip: 'Mean depth of that water.' },
  debrisMass: {
    label: 'Mass of the debris',
    tip: 'Of what floats against the barrier: 500 kg is a common tree trunk.',
  },
  debrisSpeed: {
    label: 'Its speed',
    tip: 'Straight towards the barrier; seldom faster than the water.',
  },
  debrisStop: {
    label: 'Time to stop it',
    tip: 'From the first touch to standing still. A soft barrier takes longer than a wall; the force goes with one over this time.',
  },
  linkedSections: {
    label: 'Sections on one air',
    tip: 'Sections whose air is joined, so that they are watched and topped up from one point.',
  },
  dropFrom: {
    label: 'Pressure at first',
    tip: 'Measured on the shut tube or tubes, with the air at one temperature.',
  },
  dropTo: { label: 'Pressure then', tip: 'Read after the time below.' },
  dropTime: { label: 'Time between', tip: 'Between the two readings.' },
  nightTime: { label: 'How long alone', tip: 'Time for which nobody tops up.' },
  compressorFlow: { label: 'Compressor', tip: 'Free air that it delivers.' },
  startPressure: { label: 'It starts at', tip: 'Pressure at which the compressor starts.' },
  stopPressure: { label: 'It stops at', tip: 'Pressure at which the compressor stops.' },
  edgeCurrent: {
    label: 'Current along it',
    tip: 'Speed of the water along the line. It gives no thrust, but it can lift the edge of the skirt.',
  },
  ballastDensity: {
    label: 'Density of ballast',
    tip: 'Of what lies on the edge: sand in wet bags about 2000 kg/m³.',
  },
  turn: {
    label: 'Turn at a joint',
    tip: 'How far the line turns: positive away from the water, which opens the skirt; negative towards it, which folds it.',
  },
  windGust: {
    label: 'Wind gust',
    tip: 'Peak gust on the filled tube while the ground is still dry.',
  },
  filledAt: { label: 'Filled at', tip: 'Air temperature when the tube was filled.' },
  coldest: {
    label: 'Coldest hour',
    tip: 'Shut-in air loses pressure as it cools: 12 K cost about 5 kPa.',
  },
  hottest: {
    label: 'Hottest hour',
    tip: 'Shut-in air gains pressure in the sun; the fabric is checked then.',
  },
} as const
