/** Words of hearing the score. */
export const sound = {
  volume: 'Volume',
  tempo: 'Tempo',
  tempoHint: 'Quarter notes a minute; a bar lasts four',
  hear: 'Hear',
  stop: 'Stop',
  loading: 'Fetching the piano',
  percent: (volume: number) => `${Math.round(volume * 100)} %`,
  quietStart: 'It starts quiet. Mind headphones and the projector’s loudspeakers when you turn it up.',
  problems: {
    'no-audio': 'This browser cannot play sound. Everything else works without it.',
    asleep: 'The browser lets this page sound only after it has been touched. Touch it once, then ask again.',
    'no-device': 'No loudspeaker or headphones answered. Connect one, then ask again.',
    'not-loaded': 'The piano could not be fetched. Check the connection, then ask again.',
    nothing: 'Nothing is written there yet, so there is nothing to hear.',
  },
}
