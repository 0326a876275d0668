/**
 * Raised by hand whenever the same record and edition could come to another finding, margin or evidence value.
 * It is part of every seal; a test fails when the seal of a shipped case moves without it.
 */
export const ENGINE_VERSION = '1.2.0';
