import { and, count, desc, eq, inArray } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, projectFiles } from '../../db/schema'

type NewRow = typeof projectFiles.$inferInsert

function selectFiles(db: Db) {
  return db
    .select({
      id: projectFiles.id,
      name: projectFiles.name,
      caption: projectFiles.caption,
      mediaType: projectFiles.mediaType,
      size: projectFiles.size,
      width: projectFiles.width,
      height: projectFiles.height,
      uploadedAt: projectFiles.uploadedAt,
      uploadedBy: { id: accounts.id, name: accounts.name },
    })
    .from(projectFiles)
    .innerJoin(accounts, eq(accounts.id, projectFiles.uploadedBy))
    .$dynamic()
}

/** The newest first. */
export function listFiles(db: Db, projectId: string) {
  return selectFiles(db)
    .where(eq(projectFiles.projectId, projectId))
    .orderBy(desc(projectFiles.uploadedAt), projectFiles.id)
    .all()
}

export function findFile(db: Db, projectId: string, fileId: string) {
  return selectFiles(db)
    .where(and(eq(projectFiles.projectId, projectId), eq(projectFiles.id, fileId)))
    .get()
}

export function findChecksum(db: Db, fileId: string): string | undefined {
  const { sha256 } = projectFiles
  return db.select({ sha256 }).from(projectFiles).where(eq(projectFiles.id, fileId)).get()?.sha256
}

export function listFileIds(db: Db, projectId: string): readonly string[] {
  const { id } = projectFiles
  return db
    .select({ id })
    .from(projectFiles)
    .where(eq(projectFiles.projectId, projectId))
    .all()
    .map((row) => row.id)
}

/** Those of the ids that a project holds. */
export function listKnownFileIds(db: Db, ids: readonly string[]): readonly string[] {
  const { id } = projectFiles
  return db
    .select({ id })
    .from(projectFiles)
    .where(inArray(id, [...ids]))
    .all()
    .map((row) => row.id)
}

export function countFiles(db: Db, projectId: string): number {
  return db
    .select({ total: count() })
    .from(projectFiles)
    .where(eq(projectFiles.projectId, projectId))
    .get()!.total
}

export function insertFile(db: Db, row: NewRow): void {
  db.insert(projectFiles).values(row).run()
}

export function updateFile(db: Db, fileId: string, row: Partial<NewRow>): void {
  if (Object.keys(row).length === 0) return
  db.update(projectFiles).set(row).where(eq(projectFiles.id, fileId)).run()
}

export function deleteFile(db: Db, fileId: string): void {
  db.delete(projectFiles).where(eq(projectFiles.id, fileId)).run()
}
