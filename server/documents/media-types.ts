export const spreadsheetMediaType = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';
export const pdfMediaType = 'application/pdf';
