/** The finding whose `figures.submission` names another submission, which its reader may not be allowed to see. */
export const sameFileCode = "same-file-elsewhere";
