import type { Role } from '../../../shared/domain/access.ts'

/** People of the invented firm. The first three are the accounts shown on the sign-in page. */
export const demoPeople: { name: string; email: string; role: Role }[] = [
  { name: 'Ines Okafor', email: 'lead@brackenholt.example', role: 'lead' },
  { name: 'Tobias Renn', email: 'estimator@brackenholt.example', role: 'estimator' },
  { name: 'Crew phone 1', email: 'crew@brackenholt.example', role: 'crew' },
  { name: 'Marta Quill', email: 'marta.quill@brackenholt.example', role: 'estimator' },
  { name: 'Crew phone 2', email: 'crew2@brackenholt.example', role: 'crew' },
]

export const demoPassword = 'quillwater-demo'
export const demoAccounts = { emails: demoPeople.slice(0, 3).map(({ email }) => email), password: demoPassword }
export const demoFirm = { name: 'Brackenholt Floors', address: '7 Tannery Yard\nNether Brackenholt', phone: '1-800-555-0118' }
