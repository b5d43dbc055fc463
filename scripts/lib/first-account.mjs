export const announceFirstAccount = async () => {}
