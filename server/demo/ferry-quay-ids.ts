/** Ids that other seeds of the demonstration refer to. */
export const FERRY_QUAY = {
  project: 'demo-ferry-quay',
  lockGauge: 'demo-gauge-lock',
  boardGauge: 'demo-gauge-quay-board',
  lowRoad: 'demo-line-low-road',
  offTheGravel: 'demo-line-off-the-gravel',
  behindTheKerb: 'demo-line-behind-the-kerb',
} as const
