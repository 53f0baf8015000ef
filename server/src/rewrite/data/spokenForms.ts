// How abbreviations and odd spellings are spoken, for the article before them. Common practice, from memory.

/** Abbreviations in capitals that are spoken as words, so that their first letter sounds as in a word. */
export const SPOKEN_AS_WORDS: ReadonlySet<string> = new Set(
  (
    'LAN WAN RAM ROM SIM SAN NAS NAT NIC NUMA RAID REST SOAP SAML SATA SCSI SIEM SCADA SWIFT SOC HIPAA FIFO LIFO LUN LAMP MIDI MIME MAC ' +
    'NASA NATO NOAA LASER RADAR SONAR SCUBA FEMA FINRA FIPS MOOC MOSFET MODBUS SNOMED SCRUM LIDAR LINUX MAME NAND NOR NOSQL ' +
    'HEX HATEOAS HUD LIMS RADIUS RISC SPARQL SPICE SAP SAAS SLIP SMART SNAP STEM SWAT NAPTR NACK NIST NOP MAN MUX MIPS FOSS FLOSS FAT FUSE HAL ' +
    'LEO LOB REPL RAT ROI SHA SPAM SLAM SCIM SCORM SIP SOX SMOG SERP MERN MEAN LOL'
  ).split(' '),
);

/** Abbreviations that some speak letter by letter and some as a word: either article is right. */
export const SPOKEN_EITHER_WAY: ReadonlySet<string> = new Set('SQL FAQ LED MIB RPM SIG ROI URI HAL'.split(' '));

/** Lower-case or mixed-case names and how they sound: `vowel` takes *an*. */
export const SPOKEN_NAMES: ReadonlyMap<string, 'vowel' | 'consonant'> = new Map(
  (
    [
      ['nginx', 'vowel'],
      ['npm', 'vowel'],
      ['mtls', 'vowel'],
      ['sftp', 'vowel'],
      ['ssh', 'vowel'],
      ['x86', 'vowel'],
      ['xhtml', 'vowel'],
      ['xdebug', 'vowel'],
      ['mysql', 'consonant'],
      ['nosql', 'consonant'],
      ['nvme', 'vowel'],
      ['lvm', 'vowel'],
      ['mqtt', 'vowel'],
      ['rsync', 'vowel'],
      ['mdns', 'vowel'],
      ['nfs', 'vowel'],
      ['xfs', 'vowel'],
      ['ntfs', 'vowel'],
      ['url', 'consonant'],
      ['uri', 'consonant'],
      ['usb', 'consonant'],
      ['uuid', 'consonant'],
      ['nvidia', 'vowel'],
    ] as const
  ).map(([name, sound]) => [name, sound]),
);
