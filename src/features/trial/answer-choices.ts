// The choices that the wizard offers; their words stand in `locales/<language>/wizard.json` and `safety.json` under the same names.

export const starterNames = [
  'sealing',
  'moulding',
  'coating',
  'machining',
  'baking',
  'gluing',
  'mixing',
  'drying',
  'cutting',
  'soldering',
  'filling',
  'printing',
  'blank',
] as const;
export type StarterName = (typeof starterNames)[number];

/** What a better result is: higher, lower, or close to one value. */
export const wishes = ['more', 'less', 'target'] as const;

/** `scored`: by eye, 0 to 10; the statistics take it as measured. */
export const resultKinds = ['measured', 'scored', 'rejects', 'flaws'] as const;
export type ResultKind = (typeof resultKinds)[number];

/** When the number is there. */
export const measuringTimes = ['atOnce', 'minutes', 'later'] as const;

/** Whether a limit binds the mean of a run or each single part. */
export const limitBearers = ['mean', 'part'] as const;

export const settingEnds = ['low', 'high'] as const;
export type SettingEnd = (typeof settingEnds)[number];

export const hazardNames = [
  'hotParts',
  'pressure',
  'movingParts',
  'chemicals',
  'electricity',
  'dustOrFumes',
  'lifting',
  'loudNoise',
] as const;
export type HazardName = (typeof hazardNames)[number];

/** The usual cautions of each hazard (common practice); which of them stand is the shop's to tick. */
export const cautionsOf = {
  hotParts: ['guardsClosed', 'heatGloves', 'coolBeforeTouch'],
  pressure: ['pressureWithinPlate', 'reliefValveTested', 'releaseBeforeOpening'],
  movingParts: ['guardsClosed', 'emergencyStopTested', 'lockedOutBeforeReaching'],
  chemicals: ['safetySheetRead', 'glovesAndGoggles', 'eyeWashNear'],
  electricity: ['coversClosed', 'licensedElectrician', 'lockedOutBeforeReaching'],
  dustOrFumes: ['extractionOn', 'maskWorn', 'noOpenFlame'],
  lifting: ['liftingAid', 'twoPeople', 'wayClear'],
  loudNoise: ['earProtection', 'shortStay', 'signalsSeen'],
} as const satisfies Record<HazardName, readonly string[]>;

export const cautionNames = [
  'guardsClosed',
  'heatGloves',
  'coolBeforeTouch',
  'pressureWithinPlate',
  'reliefValveTested',
  'releaseBeforeOpening',
  'emergencyStopTested',
  'lockedOutBeforeReaching',
  'safetySheetRead',
  'glovesAndGoggles',
  'eyeWashNear',
  'coversClosed',
  'licensedElectrician',
  'extractionOn',
  'maskWorn',
  'noOpenFlame',
  'liftingAid',
  'twoPeople',
  'wayClear',
  'earProtection',
  'shortStay',
  'signalsSeen',
] as const;
export type CautionName = (typeof cautionNames)[number];

export const stopRules = ['smoke', 'jam', 'leak', 'alarm', 'oddSound', 'someoneHurt'] as const;
export type StopRule = (typeof stopRules)[number];

/** What happens to the parts of the trial. */
export const partsFates = ['throwAway', 'hold', 'use'] as const;

export const aroundThings = ['batch', 'shift', 'machine', 'gauge', 'room', 'crew'] as const;
export type AroundThing = (typeof aroundThings)[number];

export const aroundWays = ['same', 'split', 'writeDown', 'noIssue'] as const;
export type AroundWay = (typeof aroundWays)[number];

/** What may be done about each thing. Crews are never compared; runs are split only where the plan can take it out again. */
export const waysFor = {
  batch: ['same', 'split', 'writeDown', 'noIssue'],
  shift: ['same', 'split', 'writeDown', 'noIssue'],
  machine: ['same', 'split', 'writeDown', 'noIssue'],
  gauge: ['same', 'writeDown', 'noIssue'],
  room: ['same', 'writeDown', 'noIssue'],
  crew: ['same', 'writeDown'],
} as const satisfies Record<AroundThing, readonly AroundWay[]>;

/** How a person gets the runs. */
export const runWays = ['text', 'linePhone', 'paper'] as const;
export type RunWay = (typeof runWays)[number];

/** When the next run goes out: when the last is made, when they text GO, or every so many minutes. */
export const paces = ['made', 'go', 'every'] as const;

/** What was decided about one of the hardest mixes. Nobody ticks "safe". */
export const lookDecisions = ['runBefore', 'engineerAgrees', 'ruledOut'] as const;

export const readyChecks = [
  'guardsOn',
  'crewMaySayNo',
  'boxAndLabels',
  'enoughMaterial',
  'gaugeChecked',
] as const;
