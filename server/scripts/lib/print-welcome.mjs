/** What a person needs after the start: where to go, and as whom. */
export function printWelcome(message, { logFile } = {}) {
  const lines = ['', `Clauseway is ready: ${message.url}`];
  if (message.setUpLink) {
    lines.push('', 'There is no organisation yet. This link makes the agency and its administrator, once:');
    lines.push(`  ${message.setUpLink}`);
  }
  if (message.demoPeople?.length) {
    lines.push('', `Demo sign-ins, all with the password ${message.demoPeople[0].password}`);
    const width = Math.max(...message.demoPeople.map((person) => person.email.length));
    for (const person of message.demoPeople) {
      lines.push(`  ${person.email.padEnd(width)}  ${person.roles.join(', ')} · ${person.organisation}`);
    }
  }
  if (message.demoWorkbooks) lines.push('', `Workbooks to upload by hand: ${message.demoWorkbooks}`);
  if (logFile) lines.push('', `Log: ${logFile}`);
  lines.push('', 'Ctrl-C stops it.', '');
  console.log(lines.join('\n'));
}
