import { everyone, policy } from './policy'

const atTheCounter = ['foreman', 'technician', 'advisor'] as const

export const readVehicles = policy('vehicles.read', everyone)
export const createVehicle = policy('vehicles.create', atTheCounter)
export const updateVehicle = policy('vehicles.update', atTheCounter)
