import preset from '@/scene/model/presets/i3-1000.json' with { type: 'json' }

export const axial = preset.cylinders[0].axialMm / 1000

/** A pin on the crown of the first piston of the in-line three. */
export const crown = (number: number, more: object = {}) => ({
  ...{
    number,
    part: 'piston:1',
    point: [0, 0.02, axial],
    form: 'filled',
    on: false,
    label: `Note ${number}`,
  },
  ...more,
})
