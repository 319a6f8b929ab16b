/** Source of the example barriers: nobody's product. */
export const BARRIER_SOURCE = 'Invented example: enter the figures of your own barrier'

/** Source of the grounds: what the friction rests on. */
export const GROUND_SOURCE =
  'Engineering judgement: no published friction exists for a coated skirt on wet ground; make a drag test'
