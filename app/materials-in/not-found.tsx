export { RoomNotFound as default } from '@/app/_ui/shell/RoomNotFound'
