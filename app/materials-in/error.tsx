'use client'

export { RoomError as default } from '@/app/_ui/shell/RoomError'
