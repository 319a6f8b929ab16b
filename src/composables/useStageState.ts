import { onBeforeUnmount, watch } from 'vue'
import {
  openStageChannel,
  type StageCommand,
  type StageMessage,
  type StageState,
} from '@/demonstrator/stage-channel'
import { useCalm } from './useCalm'

/** What a stage does for its presenter view. */
export interface StageEnd {
  readonly state: () => StageState
  readonly act: (command: StageCommand) => void
  readonly guess: (guess: number | null) => void
}

/** The stage's end of the channel: tells where it is, and does what it is asked. */
export function useStageState({ state, act, guess }: StageEnd): void {
  const calm = useCalm(state, { urgent: () => `${state().scene} ${state().phase}` })
  const channel = openStageChannel((message) => hear(message))
  const tell = (): void => channel.send({ kind: 'state', state: state() })

  function hear(message: StageMessage): void {
    if (message.kind === 'hello') tell()
    else if (message.kind === 'command') act(message.command)
    else if (message.kind === 'guess') guess(message.guess)
  }

  watch(calm, tell, { immediate: true })
  onBeforeUnmount(() => {
    channel.send({ kind: 'bye' })
    channel.close()
  })
}
