/** Letters of the name under which an event speaks of its subject. */
export const SUBJECT_LABEL_MAX = 120;
