import type { KeyFile } from './key-file'

const databaseName = 'breakaway-signing'
const storeName = 'keys'

/** Keeps a wrapped key in this browser's own storage, under its public key, and asks the browser not to clear it away. */
export async function keepKeyFile(file: KeyFile): Promise<void> {
  await withStore('readwrite', (store) => store.put(file))
  await navigator.storage?.persist?.()
}

/** The wrapped key that belongs to a public key (base64); undefined if this browser does not hold it. */
export async function findKeyFile(spki: string): Promise<KeyFile | undefined> {
  return withStore<KeyFile | undefined>('readonly', (store) => store.get(spki))
}

export async function forgetKeyFile(spki: string): Promise<void> {
  await withStore('readwrite', (store) => store.delete(spki))
}

async function withStore<T>(mode: IDBTransactionMode, use: (store: IDBObjectStore) => IDBRequest<T>): Promise<T> {
  const database = await open()
  try {
    const transaction = database.transaction(storeName, mode)
    const request = use(transaction.objectStore(storeName))
    // Only a finished transaction is on disk.
    await new Promise<void>((resolve, reject) => {
      transaction.oncomplete = () => resolve()
      transaction.onabort = () => reject(transaction.error)
    })
    return request.result
  } finally {
    database.close()
  }
}

function open(): Promise<IDBDatabase> {
  return new Promise((resolve, reject) => {
    const request = indexedDB.open(databaseName, 1)
    request.onupgradeneeded = () => request.result.createObjectStore(storeName, { keyPath: 'spki' })
    request.onsuccess = () => resolve(request.result)
    request.onerror = () => reject(request.error)
  })
}
