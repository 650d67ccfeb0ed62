import type PDFDocument from 'pdfkit';

export type PdfDocument = InstanceType<typeof PDFDocument>;
