// A small documentation set in two languages, as a translation tree holds it, with a mix of its own in each language.

/** Pages by path. `fr/` is told by its path and its text, `guide.fr.md` by the suffix, `notes.md` by its paragraphs. */
export const BILINGUAL_PAGES: Readonly<Record<string, string>> = {
  'en/start.md':
    '# Start\n\nThe datalogger keeps the samples of the buoy. Open the datalogger on the deck, and read the datalogger before you leave. A datalogger is dry.\n',
  'en/care.md':
    '# Care\n\nThe data logger keeps the samples of the buoy. Open the data logger on the deck, and read the data logger before you leave. A data logger is dry.\n',
  'fr/debut.md':
    '# Début\n\nLa bouée envoie ses données avec le mot-clé du port. Ouvrez le mot-clé sur la station, et lisez ce que le mot-clé vous a envoyé.\n',
  'fr/soin.md':
    '# Soin\n\nLa station garde les données du mot clé pendant trente jours. Le mot clé est dans le port, et le mot clé n’est pas pour les visiteurs.\n',
  'guide.fr.md': '# Guide\n\nVoir la station.\n',
  'notes.md':
    'The crew that was on the shore kept the station dry, and the datalogger of the station was not wet after the storm.\n\nL’équipe qui était sur le rivage a gardé la station au sec, et le datalogger de la station n’était pas mouillé après la tempête.\n',
};
