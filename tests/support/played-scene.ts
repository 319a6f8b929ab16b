import type { CourseScene } from '../../shared/demonstrator/course'
import { scriptDuration, valuesAt } from '../../shared/demonstrator/motion'
import { sceneFacts } from '../../shared/demonstrator/scene-facts'
import type { DemoSetting } from '../../shared/demonstrator/setting'

/** A scene some way into its script; its whole length if nothing is said. */
export function playedScene(
  scene: CourseScene,
  share = 1,
  { answer } = sceneFacts(scene, scene.start),
): DemoSetting {
  const seconds = share * scriptDuration(scene.legs)
  return { ...scene.start, values: valuesAt(scene.start.values, scene.legs, answer, seconds) }
}
