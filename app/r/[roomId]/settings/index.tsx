/** The list of settings is drawn by the layout around, beside or instead of this. */
export default function SettingsIndex() {
  return null;
}
