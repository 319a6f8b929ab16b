/** All that a drawing needs to become a file; loaded when the first one is saved. */
export { captionedScene } from '@shared/drawing/captioned-scene'
export { sceneToSvg } from '@shared/drawing/scene-to-svg'
export { sceneFontFaces } from './scene-fonts'
