export { RoomLoading as default } from '@/app/_ui/shell/RoomLoading'
