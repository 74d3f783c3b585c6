/** Closed lists of the desk's own words. Each feeds the database's columns, the input schemas and the types. */

export const VERDICTS = [
  'sound',
  'sound after changes',
  'not supported',
  'cannot be judged from what is given',
] as const
export type Verdict = (typeof VERDICTS)[number]

export const VERDICT_STATUSES = ['drafted', 'sent back', 'released'] as const
export type VerdictStatus = (typeof VERDICT_STATUSES)[number]

export const ASSIGNMENT_STATUSES = ['offered', 'accepted', 'declined', 'ended', 'done'] as const
export type AssignmentStatus = (typeof ASSIGNMENT_STATUSES)[number]

export const AUDIENCES = ['authors', 'editor', 'private'] as const
export type Audience = (typeof AUDIENCES)[number]

export const COMMENT_TARGETS = ['whole', 'family', 'finding', 'report', 'place'] as const
export type CommentTarget = (typeof COMMENT_TARGETS)[number]

export const POINT_STATUSES = ['open', 'kept', 'dropped'] as const
export type PointStatus = (typeof POINT_STATUSES)[number]

export const FILE_KINDS = ['manuscript', 'table'] as const
export type FileKind = (typeof FILE_KINDS)[number]

/** Media type of a Word document (.docx). */
export const WORD_DOCUMENT =
  'application/vnd.openxmlformats-officedocument.wordprocessingml.document' as const

export const AUDIT_STATUSES = ['queued', 'running', 'done', 'stuck'] as const
export type AuditStatus = (typeof AUDIT_STATUSES)[number]

export const JOB_KINDS = ['run-audit', 'send-mail'] as const
export type JobKind = (typeof JOB_KINDS)[number]

export const JOB_STATUSES = ['queued', 'running', 'done', 'failed'] as const
export type JobStatus = (typeof JOB_STATUSES)[number]

export const MAIL_STATUSES = ['queued', 'sent', 'failed'] as const
export type MailStatus = (typeof MAIL_STATUSES)[number]

export const LINK_PURPOSES = ['invitation', 'password'] as const
export type LinkPurpose = (typeof LINK_PURPOSES)[number]

export const BLINDINGS = ['single', 'double', 'open'] as const
export type Blinding = (typeof BLINDINGS)[number]

/** What a reviewer can change on an audit; each change is a row with who, when and why. */
export const CHANGE_KINDS = [
  'move-report',
  'add-report',
  'remove-report',
  'correct-report',
  'split-family',
  'merge-families',
  'rename-family',
  'set-procedure',
  'set-m',
  'set-alpha',
  'set-groups',
  'set-scale',
  'join-reports',
  'part-reports',
] as const
export type ChangeKind = (typeof CHANGE_KINDS)[number]
