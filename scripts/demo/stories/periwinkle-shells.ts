import { writePaper, type Story } from './story'

// Protected by a password: it cannot be read, and the desk says so.
export const periwinkleShells: Story = {
  key: 'periwinkle-shells',
  manuscript: writePaper({
    title: 'Shell thickness of periwinkles on exposed and sheltered shores',
    authors: 'Odo Pellworth',
    runningHead: 'Periwinkle shells',
    layout: 'one column',
    password: 'low water',
    abstract: 'Shells were thicker on exposed shores (t(58) = 3.11, p = 0.003).',
    introduction: ['Waves break shells.'],
    methods: ['Thirty shells from each of two shores were measured.'],
    results: ['Shells were thicker on the exposed shore (t(58) = 3.11, p = 0.003).'],
    discussion: ['One test was made.'],
  }),
  results: null,
  form: { alpha: 0.05, correction: 'None: one test', primaryOutcome: 'Shell thickness', note: '' },
}
