/** Words of the demonstrator: few, and large. */
export const demonstratorTexts = {
  title: 'Demonstrator',
  presenterTitle: 'Presenter view',
  stage: 'Scene {number} of {count}',
  verbatim: '{text}',

  course: {
    label: 'Course',
    short: 'Short course, {minutes}',
    full: 'Full course, {minutes}',
  },

  nav: {
    back: 'Back',
    show: 'Show',
    next: 'Next',
    controls: 'Change something',
    script: 'Back to the script',
    black: 'Black',
    light: 'Light again',
    fullScreen: 'Full screen',
    reset: 'Reset',
    presenter: 'Presenter view',
    leave: 'Leave the demonstrator',
    keys: 'Arrow keys or clicker: on and back · ↑ ↓ guess · B black · R reset · F full screen',
    isBlack: 'The picture is black. Press B or touch to go on.',
  },

  guess: {
    label: 'The room’s guess',
    none: 'no guess yet',
    mark: 'the room: {guess}',
    clear: 'No guess',
    off: 'the room: {guess} · it is {answer}',
  },

  live: {
    title: 'Change anything',
    depth: 'Depth of water',
    dryDepth: 'Water on the dry side',
    skirtLength: 'Skirt unrolled',
    airPressure: 'Air, as filled',
    temperature: 'Temperature now',
    gust: 'Gust of wind',
    crease: 'Crease under the skirt',
    rateOfRise: 'Rate of rise',
    edge: 'Skirt edge',
    ground: 'Ground',
    tube: 'Tube',
    tubeOf: 'tube {diameter}',
    stone: 'A stone under the skirt (shown, not computed)',
    isChanged: 'changed by hand',
  },
  edge: { open: 'open', weighed: 'weighed', sealed: 'sealed' },
  ground: {
    turf: 'mown turf',
    'wet-grass': 'wet grass',
    concrete: 'concrete',
    asphalt: 'asphalt',
    'loose-gravel': 'loose gravel',
    'bare-mud': 'bare mud',
  },

  verdict: {
    label: 'This section',
  },
  cautions:
    'A design check, not a guarantee. Local codes, the barrier’s own instructions and a licensed engineer come first. Leave before the water reaches the leave level. Nobody on the wet side.',

  heavy: {
    bag: 'as heavy as {count} sandbags of {each}',
    person: 'as heavy as {count} grown-ups of {each}',
    piano: 'as heavy as {count} pianos of {each}',
    cow: 'as heavy as {count} cows of {each}',
    car: 'as heavy as {count} cars of {each}',
    elephant: 'as heavy as {count} elephants of {each}',
  },

  figure: {
    push: {
      metric: '{mass} on every metre',
      us: '{mass} on every foot',
      times: '{deeper} times the depth, {harder} times the push',
      exact: 'thrust {force} at {depth}',
    },
    floats: {
      head: 'Gone at {depth} of water',
      none: 'It stays where it is',
      lifts: 'It floats and rolls off. The tube weighs {mass}, and that is all there is.',
      skirted: 'With its skirt unrolled it stays until {depth}.',
      exact: 'water lifts {lift}, own weight {self}, at {depth}',
    },
    unroll: {
      metric: '{mass} stand on every metre',
      us: '{mass} stand on every foot',
      push: 'Push: {push}. The tube alone: {self}.',
      exact: 'water on the skirt {force}, thrust {thrust}',
    },
    grip: {
      head: 'They cross at {depth}',
      none: 'Push never reaches grip',
      stop: 'We stop at {holdsTo}: grip must be {required} times the push.',
      stopOther: 'We stop at {holdsTo}: another check comes first.',
      stopNowhere: 'No water is safe here.',
      exact: 'push {push}, grip {grip} at {depth}',
    },
    creep: {
      head: '{share} of the grip is gone',
      none: 'There is no grip to lose',
      edges: 'Holds to: open edge {open}, weighed {weighed}, sealed {sealed}.',
      crease:
        'A crease of {crease} lets {flow} through every metre of it. Twice as high: {more} times as much.',
      exact: 'water under the skirt {uplift}, on it {onSkirt}',
    },
    grounds: {
      head: 'On this ground it holds to {depth}',
      nowhere: 'Do not rely on it here',
      others: 'Turf {turf}, asphalt {asphalt}, wet grass {wet}.',
      mud: 'Bare mud and loose gravel: not a ground to stand on, whatever the figures say.',
      exact: 'friction {friction}: judgement, not measured. Pull a piece of skirt and see.',
    },
    night: {
      head: 'The crest sinks {drop}',
      none: 'Too soft: the tube gives way',
      air: 'From {filled} to {now} the air drops from {before} to {after}.',
      do: 'Top up at dusk, and look again at the coldest hour.',
      exact: 'crest {crest} above the ground, freeboard {freeboard}',
      exactNone: 'no shape stands at {after}',
    },
    puncture: {
      head: '{flow} through one section',
      rush: 'First rush {rush}. One section is {length} long.',
      linked: 'Linked air without valves: {fallen} of {count} sections go. Isolated: one.',
      tubs: '{count} bath tubs of {each} every second',
      exact: 'at most {flow}, as over a broad crest at {depth}',
    },
    wind: {
      head: 'Gone at a gust of {gust}',
      none: 'No gust moves it',
      ballast: 'Lay {ballast} on the skirt for a gust of {gust}, before the water comes.',
      cyclist: '{count} times as fast as somebody on a bicycle ({each})',
      exact: 'wind {force}, friction resistance {grip}',
    },
    pond: {
      head: 'No more than {depth} on the dry side',
      none: 'It does not hold, even with a dry side',
      never: 'Any depth on the dry side holds',
      grip: '{share} of the grip goes with it. Pumps are part of the barrier.',
      seeps: 'Through the ground seeps {flow}.',
      exact: 'grip {grip} instead of {dry}, push {push}',
    },
    leave: {
      head: 'We leave at {depth}',
      none: 'No leave level: do not rely on it',
      why: 'Holds to {holdsTo}. It rises {rise} in an hour; clearing takes {clear}.',
      margin: '{margin} below what holds: that is our way out.',
      exact: 'water now {depth}, holds to {holdsTo}',
    },
  },

  draw: {
    title: 'The scene as a drawing',
    wet: 'Wet side',
    dry: 'Dry side',
    push: 'push {value}',
    grip: 'grip {value}',
    onSkirt: 'on the skirt {value}',
    wind: 'wind {value}',
    through: 'through {value}',
    sunk: 'sunk {value}',
    givesWay: 'gives way',
    level: '{depth}',
    holdsTo: 'holds to {depth}',
    leave: 'leave at {depth}',
    stop: 'stop at {depth}',
    gone: 'gone at {depth}',
    crossing: 'they cross: {depth}',
    on: {
      turf: 'turf {depth}',
      asphalt: 'asphalt {depth}',
      'wet-grass': 'wet grass {depth}',
    },
    stone: 'stone: shown, not computed',
    depthAxis: 'depth of water',
    pushName: 'push',
    gripName: 'grip',
    chartTitle: 'Push against grip',
    chartDescribe: 'Push and grip up to {depth} of water.',
    tick: '{value}',
    describe: 'Water {depth} deep on the left, {dry} on the right. Push {push}.',
  },

  presenter: {
    now: 'Now',
    next: 'Next scene',
    end: 'That was the last scene',
    notes: 'Notes',
    see: 'What you should see',
    clock: 'Clock',
    of: 'of {minutes}',
    start: 'Start the clock',
    stop: 'Stop',
    zero: 'From zero',
    phase: { ask: 'asking', showing: 'showing', shown: 'shown' },
    alone: 'No stage is open in another window of this browser.',
    open: 'Open the stage',
    joined: 'In step with the stage.',
  },

  scene: {
    push: {
      title: 'Water pushes',
      question: 'Now {push}. Twice as deep: how much?',
      see: 'The arrow grows four times, the depth only twice.',
      notes:
        'Let the room guess in kilograms on one metre of barrier. Most say double. Then show. Say: every centimetre at the top costs more than the one below.',
    },
    floats: {
      title: 'No skirt',
      question: 'A tube, no skirt. How deep before it goes?',
      see: 'At a few centimetres the tube lifts off, rolls and is gone.',
      notes:
        'Ask for hands: knee, ankle, finger. The tube weighs less than a crate of water. Nobody believes how early it goes.',
    },
    unroll: {
      title: 'Unroll the skirt',
      question: 'Same tube, skirt out, {depth} of water. What stands on each metre?',
      see: 'The skirt lies flat, then the water comes and stands on it. The tube stays.',
      notes:
        'The same water that pushed the tube away now stands on its skirt. Compare both bars: the weight is many times the push.',
    },
    grip: {
      title: 'Push against grip',
      question: 'Wet grass. At what depth does push beat grip?',
      see: 'Two lines climb. Push is curved, grip is nearly straight. They cross.',
      notes:
        'Grip grows with the depth, push with its square: push always wins in the end. We stop long before, where grip is still one and a half times the push.',
    },
    creep: {
      title: 'Water creeps under',
      question: 'Water gets under the skirt. How much grip does it take?',
      see: 'Red arrows grow from below; the grip bar shrinks. Weighing the edge gives some of it back.',
      notes:
        'Edge bags, a trench, no creases, no gravel. Put the stone into the picture: it is only shown, because nobody can compute it. Show a crease of two millimetres.',
    },
    grounds: {
      title: 'What it lies on',
      question: 'On turf it holds to {turf}. And on asphalt?',
      see: 'The water rises to what asphalt holds. Marks of turf and wet grass stay below.',
      notes:
        'Friction values are judgement. A drag test with a piece of skirt and a spring balance is better. Mud and loose gravel: we do not set up.',
    },
    night: {
      title: 'A cold night',
      question: 'Filled at noon. Tonight it freezes. How far does the crest sink?',
      see: 'The tube gets rounder at the foot and lower at the crest; the air figure drops.',
      notes:
        'Same air, less pressure. Nothing leaked. Who looks after the pressure at four in the morning? Colder still, and the tube gives way: try it.',
    },
    puncture: {
      title: 'One section goes soft',
      question: 'One section loses its air. How much comes through?',
      see: 'The tube sinks, gives way and the water runs over it.',
      notes:
        'Nobody stands behind a loaded barrier without a way out. With linked air and no valves all of them go. Isolate the sections.',
    },
    wind: {
      title: 'Before the water',
      question: 'Empty tube, dry ground. What gust takes it away?',
      see: 'The wind arrow grows until it is as long as the grip.',
      notes:
        'The weight that holds it is not there yet. Lay ballast on the skirt as soon as it is filled. Almost always needed.',
    },
    pond: {
      title: 'Water behind us',
      question: 'How deep may it get on the dry side?',
      see: 'A little water on the dry side, and the grip bar shrinks to its limit.',
      notes:
        'What seeps and what rains must be pumped out. Water behind the barrier lifts it. A pump that stops is a barrier that slides.',
    },
    leave: {
      title: 'When we leave',
      question: 'It rises {rise} in an hour. At what level do we leave?',
      see: 'The water stops below the mark of what holds. In between lies our way out.',
      notes:
        'The leave level is not where it fails. It is where you still have time. Say it aloud, write it on the barrier, name who calls it.',
    },
  },
} as const
