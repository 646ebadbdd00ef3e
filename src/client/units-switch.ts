/** Keeps the reader's choice of mm, inch or both, and shows every size on the page accordingly. */
class UnitsSwitch extends HTMLElement {
  connectedCallback(): void {
    const root = document.documentElement;
    for (const input of this.querySelectorAll('input')) {
      input.checked = input.value === root.dataset['units'];
      input.addEventListener('change', () => {
        root.dataset['units'] = input.value;
        keep(input.value);
      });
    }
  }
}

function keep(units: string): void {
  try {
    localStorage.setItem('units', units);
  } catch {
    // Where nothing may be kept, the choice holds for this page.
  }
}

customElements.define('units-switch', UnitsSwitch);
