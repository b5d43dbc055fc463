import { type MiniStaffInput, miniStaff } from '@/lib/domain/charts/mini-staff'
import { DrawingView } from './DrawingView'

/** The newest lots of one characteristic on a small staff. */
export function MiniStaff(input: MiniStaffInput) {
  return <DrawingView drawing={miniStaff(input)} className="mini-staff" />
}
