import { onBeforeUnmount, onMounted, shallowReadonly, shallowRef } from 'vue'
import {
  openStageChannel,
  type StageCommand,
  type StageMessage,
  type StageState,
} from '@/demonstrator/stage-channel'

/** The presenter's end of the channel: where the stage is, and what to ask of it. */
export function usePresenterState() {
  const state = shallowRef<StageState | null>(null)
  const channel = openStageChannel((message) => hear(message))

  function hear(message: StageMessage): void {
    if (message.kind === 'state') state.value = message.state
    else if (message.kind === 'bye') state.value = null
  }

  onMounted(() => channel.send({ kind: 'hello' }))
  onBeforeUnmount(() => channel.close())

  return {
    state: shallowReadonly(state),
    ask: (command: StageCommand) => channel.send({ kind: 'command', command }),
    guess: (guess: number | null) => channel.send({ kind: 'guess', guess }),
  }
}
