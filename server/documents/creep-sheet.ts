import type exceljs from 'exceljs';
import { neutralise } from '../workbook/neutralise';
import type { CreepWords } from './creep-words';

/** The creep tests on a sheet of their own: what was fitted in words, then every point as numbers. */
export function addCreepSheet(workbook: exceljs.Workbook, creep: CreepWords | null): void {
  if (creep === null) return;
  const sheet = workbook.addWorksheet('Creep compliance');
  sheet.columns = [{ width: 16 }, { width: 14 }, { width: 14 }, { width: 16 }, { width: 18 }, { width: 18 }];
  for (const { title, lines } of creep.curves) {
    sheet.addRow([neutralise(`Creep compliance ${title}`)]).font = { bold: true };
    for (const line of lines) sheet.addRow([neutralise(line)]);
    sheet.addRow([]);
  }
  for (const line of creep.master) sheet.addRow([neutralise(line)]);
  if (creep.master.length > 0) sheet.addRow([]);
  const heads = ['Temperature, °C', 'Stress, kPa', 'Specimen', 'Loading time, s', 'D(t), 1/GPa', 'Cell'];
  sheet.addRow(heads).font = { bold: true };
  for (const { temperature, stress, specimen, time, value, cell } of creep.points)
    sheet.addRow([temperature, stress, neutralise(specimen), time, value, neutralise(cell)]);
}
