/** A template that does not compile: a fault of the program, or a picture that is none. */
export class TypesettingError extends Error {
  override readonly name = 'TypesettingError'
}
