/** Where the API answers: beside the application itself, so that no address is configured in the browser. */
export const API_BASE = "/api/v1";
