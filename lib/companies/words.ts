/** The form in which company names are compared: lower case, NFC, single spaces. Doubled companies share it. */
export const companyKey = (name: string) => name.normalize("NFC").trim().toLowerCase().replaceAll(/\s+/g, " ").slice(0, 200);
