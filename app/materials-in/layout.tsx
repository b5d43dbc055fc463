export { RoomLayout as default } from '@/app/_ui/shell/RoomLayout'
