/** Password of every account of the demo, shown on the sign-in page; production never loads a demo. */
export const demoPassword = 'grey-board-demo';
