import { notFound } from 'next/navigation'
import { CalculatorScreen } from '@/components/calculator/calculator-screen'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'

export const metadata = { title: 'Calculator' }

export default async function CalculatorPage() {
  const actor = await requireActor()
  if (!may(actor, 'calculator.use')) notFound()
  return (
    <Page>
      <PageHead
        title="Calculator"
        lead="Corrects a list of tests without a manuscript. It helps a qualified statistician and decides nothing; compare what was read with what you pasted. What you type stays in this browser and in the address."
      />
      <CalculatorScreen />
    </Page>
  )
}
