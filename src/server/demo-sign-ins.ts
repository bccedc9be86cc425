/** The people of the demo shop who sign in; only ever seeded in demo mode, where the server listens on loopback alone. */
export const demoSignIns = [
  {
    name: 'Dana Whitlock',
    role: 'supervisor',
    email: 'dana@harrowlane.example',
    password: 'demo-seals-dana',
  },
  { name: 'Sam Okoro', role: 'engineer', email: 'sam@harrowlane.example', password: 'demo-seals-sam' },
  { name: 'Robin Vale', role: 'admin', email: 'robin@harrowlane.example', password: 'demo-seals-robin' },
] as const;
