import localFont from 'next/font/local'

/** Words and typed values. Whole TrueType files: the documents embed the same ones. */
export const workFont = localFont({
  variable: '--font-work',
  display: 'swap',
  preload: false,
  src: [
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans-semi-condensed/400Regular/SofiaSansSemiCondensed_400Regular.ttf',
      weight: '400',
      style: 'normal',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans-semi-condensed/400Regular_Italic/SofiaSansSemiCondensed_400Regular_Italic.ttf',
      weight: '400',
      style: 'italic',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans-semi-condensed/500Medium/SofiaSansSemiCondensed_500Medium.ttf',
      weight: '500',
      style: 'normal',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans-semi-condensed/600SemiBold/SofiaSansSemiCondensed_600SemiBold.ttf',
      weight: '600',
      style: 'normal',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans-semi-condensed/700Bold/SofiaSansSemiCondensed_700Bold.ttf',
      weight: '700',
      style: 'normal',
    },
  ],
})

/** Levels and margins, and nothing else: wide and bold means decibels. */
export const levelFont = localFont({
  variable: '--font-level',
  display: 'swap',
  preload: false,
  src: [
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans/600SemiBold/SofiaSans_600SemiBold.ttf',
      weight: '600',
      style: 'normal',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans/700Bold/SofiaSans_700Bold.ttf',
      weight: '700',
      style: 'normal',
    },
    {
      path: '../node_modules/@expo-google-fonts/sofia-sans/800ExtraBold/SofiaSans_800ExtraBold.ttf',
      weight: '800',
      style: 'normal',
    },
  ],
})
