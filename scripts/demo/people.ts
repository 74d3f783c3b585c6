import type { Role } from '@/lib/rules/roles'

export type DemoPerson = {
  key: string
  name: string
  email: string
  affiliation: string
  expertise: string
  roles: readonly Role[]
}

const institute = 'Tern Harbour Marine Institute'

/** The invented people of the demonstration. */
export const people = [
  {
    key: 'administrator',
    name: 'Wenna Treloske',
    email: 'wenna.treloske@ternharbour.example',
    affiliation: 'Tern Harbour Core',
    expertise: '',
    roles: ['administrator'],
  },
  {
    key: 'editor',
    name: 'Idris Vaunce',
    email: 'idris.vaunce@ternharbour.example',
    affiliation: 'Tern Harbour Core',
    expertise: 'Head of the core; designed experiments',
    roles: ['editor'],
  },
  {
    key: 'secondEditor',
    name: 'Maren Hollowick',
    email: 'maren.hollowick@ternharbour.example',
    affiliation: 'Tern Harbour Core',
    expertise: 'Multiple testing, survival',
    roles: ['editor', 'reviewer'],
  },
  {
    key: 'reviewer',
    name: 'Tamsin Orrelby',
    email: 'tamsin.orrelby@ternharbour.example',
    affiliation: 'Tern Harbour Core',
    expertise: 'Multiple comparisons, mixed models',
    roles: ['reviewer'],
  },
  {
    key: 'secondReviewer',
    name: 'Bram Ukeleigh',
    email: 'bram.ukeleigh@saltmarsh.example',
    affiliation: 'Saltmarsh Polytechnic',
    expertise: 'Ecology, ordination, false discovery rates',
    roles: ['reviewer'],
  },
  {
    key: 'submitter',
    name: 'Sela Dorrimere',
    email: 'sela.dorrimere@ternharbour.example',
    affiliation: institute,
    expertise: '',
    roles: ['submitter'],
  },
  {
    key: 'secondSubmitter',
    name: 'Corin Athelwick',
    email: 'corin.athelwick@ternharbour.example',
    affiliation: institute,
    expertise: '',
    roles: ['submitter'],
  },
  {
    key: 'thirdSubmitter',
    name: 'Nuala Frisken',
    email: 'nuala.frisken@eelgrass.example',
    affiliation: 'Eelgrass Field Station',
    expertise: '',
    roles: ['submitter'],
  },
] as const satisfies readonly DemoPerson[]

export type PersonKey = (typeof people)[number]['key']
