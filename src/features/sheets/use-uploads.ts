import { useSyncExternalStore } from 'react'
import { useUser } from '../../lib/user.ts'
import { type Upload, uploadQueue } from './upload-queue.ts'

/** The uploads of the person signed in, and how to add to them. */
export function useUploads(sheetId?: string): { uploads: Upload[]; add: (files: readonly File[]) => void } {
  const user = useUser()
  const all = useSyncExternalStore(uploadQueue.subscribe, uploadQueue.snapshot)
  return {
    uploads: all.filter((upload) => upload.ownerId === user.id && upload.sheetId === sheetId),
    add: (files) => uploadQueue.add(files, { ownerId: user.id, sheetId }),
  }
}
