export const stageAccesses = ['dock', 'stairs', 'lift', 'door', 'push'] as const
export type StageAccess = (typeof stageAccesses)[number]
export const contactDuties = ['backline', 'production', 'sound', 'delivery', 'accounts'] as const
export type ContactDuty = (typeof contactDuties)[number]
