import type { Choice } from '@/app/_ui/forms/ChoiceField'

/** Roles with what each may do, for the forms of people. */
export const roleChoicesWithNotes: readonly Choice[] = [
  {
    value: 'bench',
    label: 'Bench',
    note: 'Opens lots, records readings, corrects own ones until the lot is decided.',
  },
  {
    value: 'quality',
    label: 'Quality',
    note: 'All of the bench; decides lots, freezes limits, answers signals, keeps equipment and catalogue.',
  },
  { value: 'sales', label: 'Sales', note: 'Sees released lots; builds and publishes datasheets.' },
  { value: 'administrator', label: 'Administrator', note: 'People, settings, back-ups. Decides no lots.' },
]
