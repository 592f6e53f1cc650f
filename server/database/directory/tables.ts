export interface SettingRow { name: string, value: string }
export interface FirmRow { id: string, slug: string, name: string, created_at: string, next_due_at: string | null }
export interface AccountRow { id: string, email: string, name: string, password: string | null, language: string, created_at: string, disabled_at: string | null }
export interface MembershipRow { id: string, account_id: string, firm_id: string, subject_kind: 'person' | 'party', subject_id: string, created_at: string, ended_at: string | null }
export interface SessionRow { hash: Uint8Array, kind: 'member' | 'pass', account_id: string | null, membership_id: string | null, firm_id: string | null, pass_id: string | null, device: string, created_at: string, seen_at: string, ends_at: string, ended_at: string | null }
export interface LinkRow { hash: Uint8Array, kind: 'invitation' | 'reset', account_id: string, created_at: string, ends_at: string, used_at: string | null }
export interface AccountMailRow { id: string, message_id: string, to_address: string, subject: string, text: string, html: string, state: 'due' | 'sending' | 'sent' | 'failed', attempts: number, next_at: string, lease_until: string | null, last_error: string | null, sent_at: string | null }
export interface SignInEventRow { id: string, at: string, what: string, account_id: string | null, address: string, device: string }

/** `.data/directory.sqlite`: who may come in, and where each firm's file is. */
export interface DirectoryDatabase {
  setting: SettingRow
  firm: FirmRow
  account: AccountRow
  membership: MembershipRow
  session: SessionRow
  link: LinkRow
  account_mail: AccountMailRow
  sign_in_event: SignInEventRow
}
