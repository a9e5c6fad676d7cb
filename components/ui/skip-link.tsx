import { useWords } from '@/components/words'

/** The first thing a keyboard meets: past the navigation, to what the page is about. Styled in `public/ground.css`. */
export function SkipLink() {
  const words = useWords().common
  return (
    <a
      className="skip"
      href="#page"
      onClick={(event) => {
        event.preventDefault()
        const page = document.getElementById('page') ?? document.querySelector('[role="main"], main')
        if (!(page instanceof HTMLElement)) return
        page.tabIndex = -1
        page.focus()
      }}
    >
      {words.skip}
    </a>
  )
}
