/** First in the order of focus: jumps over the masthead. */
export function SkipLink() {
  return (
    <a
      className="r-skip"
      href="#content"
      onClick={(event) => {
        event.preventDefault();
        const content = document.getElementById('content');
        content?.focus();
        content?.scrollIntoView();
      }}
    >
      To the content
    </a>
  );
}
