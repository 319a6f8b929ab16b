import type { DemoSetting } from '@shared/demonstrator/setting'

/** Whether the room is being asked, the script runs, or the answer stands there. */
export type Phase = 'ask' | 'showing' | 'shown'

/** What the stage tells its presenter view. */
export interface StageState {
  readonly course: string
  readonly scene: number
  readonly phase: Phase
  readonly guess: number | null
  readonly isBlack: boolean
  readonly setting: DemoSetting
}

/** What the presenter view asks of the stage. */
export type StageCommand = 'next' | 'back' | 'reset' | 'black'

/** Messages between both windows of one browser. */
export type StageMessage =
  | { readonly kind: 'hello' }
  | { readonly kind: 'state'; readonly state: StageState }
  | { readonly kind: 'command'; readonly command: StageCommand }
  | { readonly kind: 'guess'; readonly guess: number | null }
  | { readonly kind: 'bye' }

/** Only windows of the same origin hear it. */
const NAME = 'toehold:demonstrator'

/** One end of the channel between stage and presenter view. */
export interface StageChannel {
  readonly send: (message: StageMessage) => void
  readonly close: () => void
}

/** Opens an end; a browser without channels has a stage without a presenter view. */
export function openStageChannel(hear: (message: StageMessage) => void): StageChannel {
  if (!('BroadcastChannel' in window)) return { send: () => undefined, close: () => undefined }
  const channel = new BroadcastChannel(NAME)
  channel.onmessage = ({ data }: MessageEvent<StageMessage>) => hear(data)
  return { send: (message) => channel.postMessage(message), close: () => channel.close() }
}
