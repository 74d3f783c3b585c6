import { notFound } from 'next/navigation'
import { createLoader, parseAsInteger } from 'nuqs/server'
import { HouseRulesForm } from '@/components/house-rules/house-rules-form'
import { listProcedures } from '@/components/house-rules/list-procedures'
import { VersionList } from '@/components/house-rules/version-list'
import { ButtonLink } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { getHouseRules, listHouseRules } from '@/db/queries/house-rules'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { changeHouseRulesAction } from './actions'

export const metadata = { title: 'House rules' }

const loadParams = createLoader({ version: parseAsInteger })

export default async function HouseRulesPage({ searchParams }: PageProps<'/house-rules'>) {
  const actor = await requireActor()
  if (!may(actor, 'house-rules.read')) notFound()
  const { version } = await loadParams(searchParams)
  const db = getDb()
  const shown = getHouseRules(db, actor, version ?? undefined)
  if (!shown) notFound()
  const versions = listHouseRules(db, actor)
  const past = version !== null && versions[0]?.version !== shown.version
  const mayChange = may(actor, 'house-rules.change') && !past
  return (
    <Page narrow>
      <PageHead
        title="House rules"
        above={shown.version === 0 ? 'The defaults, until somebody decides' : `Version ${shown.version}`}
        lead="What holds where a manuscript, a journal or a protocol says nothing else."
      />
      {past ? (
        <Notice
          tone="care"
          className="mb-6"
          action={<ButtonLink href="/house-rules">See what is in force</ButtonLink>}
        >
          This version is no longer in force; rounds that were handed in under it keep it.
        </Notice>
      ) : null}
      <HouseRulesForm
        key={shown.version}
        rules={shown.rules}
        procedures={listProcedures()}
        {...(mayChange ? { save: changeHouseRulesAction } : {})}
      />
      <VersionList versions={versions} shown={shown.version} />
    </Page>
  )
}
