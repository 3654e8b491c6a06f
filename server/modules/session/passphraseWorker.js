import { parentPort } from 'node:worker_threads'
import bcrypt from 'bcryptjs'

// Plain JavaScript, because Node 20 starts a thread from nothing else. One passphrase at a time: a hash of it, or
// whether it fits the hash that is given.
parentPort.on('message', ({ passphrase, cost, hash }) => {
  parentPort.postMessage(hash === undefined ? bcrypt.hashSync(passphrase, cost) : bcrypt.compareSync(passphrase, hash))
})
