/** Rises when the same brief or the same readings would give another plan, layout or verdict; stored beside each of them. */
export const coreVersion = '2';
