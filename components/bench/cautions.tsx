import { useBench } from './bench-state'

/** What a reader of the audit should keep in mind, where they read it. */
export function Cautions() {
  const { findings } = useBench().index.audit
  const unread = findings.filter((finding) => finding.rule === 'unread-region').length
  return (
    <div className="margin-rule mt-6 ml-10 flex max-w-prose flex-col gap-1.5 pl-4 text-xs text-ink-soft">
      <p>
        This helps a qualified statistician and decides nothing: each finding is a question until you confirm
        it.
      </p>
      <p>
        Reading can miss or misread a number, so compare it with its place on the page.
        {unread > 0 &&
          ` ${unread === 1 ? 'One region' : `${unread} regions`} of this manuscript could not be read.`}{' '}
        What is recomputed from rounded values is a range; “undecidable” is no error. That nothing is found
        does not mean that nothing is wrong.
      </p>
      <p>
        Which tests form a family is a judgement. The policy of the journal or facility, reporting guidelines
        and, in clinical work, licensed practice and the trial’s own protocol come first. An inconsistency is
        no evidence of misconduct; a concern of that kind goes to the editor in confidence.
      </p>
    </div>
  )
}
