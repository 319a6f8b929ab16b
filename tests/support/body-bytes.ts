import type { Test } from 'supertest'

/** The body of an answer that is no text, as it was sent. */
export async function bodyBytes(request: Test): Promise<Buffer> {
  const answer = await request
    .buffer()
    .parse((res, done) => {
      const parts: Buffer[] = []
      res.on('data', (part: Buffer) => parts.push(part))
      res.on('end', () => done(null, Buffer.concat(parts)))
    })
    .expect(200)
  return answer.body as Buffer
}
