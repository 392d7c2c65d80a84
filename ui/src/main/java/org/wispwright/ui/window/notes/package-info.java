/** Room: the notes as cards. Door: {@link org.wispwright.ui.window.notes.NotesPanel}. */
package org.wispwright.ui.window.notes;
