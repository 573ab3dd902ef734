/** What was read for the library, by the name the profiles use. A page was read as it stood; full papers were not opened. */
export const SOURCES = {
  altolamprologusEncyclopedia: 'Encyclopedia article on the genus Altolamprologus',
  babaultiSibwesa:
    'Water of a related species, https://tanganyika.si/TanganjikaByLocations/Sibwesa/slides/Pseudosimochromis%20babaulti%20%27Sibwesa%27.html',
  blay: 'Blay, Ghana J Sci, https://fishcomghana.com/marine-fisheries/fisheries-science/growth-and-mortality-parameters-of-sarotherodon-melanotheron-melanotheron-teleostei-cichlidae-in-two-brackishwater-systems-in-ghana/',
  borleyiProfile: 'Species profile, http://seriouslyfish.com/species/copadichromis-borleyi',
  broodLoss: 'Hydrobiologia 850:2385-2392, doi 10.1007/s10750-022-05023-3',
  burtoniEncyclopedia: 'Encyclopedia article (copy), https://de.zxc.wiki/wiki/Astatotilapia_burtoni',
  caeruleusHobby: 'Hobby page, http://www.alltropicalfish.com/freshwater-fish/76-cichlids/168-labidochromis-caeruleus',
  caeruleusProfile: 'Species profile, https://www.seriouslyfish.com/species/labidochromis-caeruleus/',
  caeruleusThumbi:
    'Labidochromis caeruleus, Thumbi Point, https://malawi.si/Malawi/Mbuna/Labidochromis/Labidochromis%20caeruleus/slides/Labidochromis%20caeruleus%20%27Thumbi%20Point%27.html',
  calvusMyFish:
    'Altolamprologus calvus (German), https://my-fish.org/my-fishothek/altolamprologus-calvus-perlhuhncichlide',
  calvusProfile: 'Species profile, http://seriouslyfish.com/species/Altolamprologus-calvus',
  clarkeStuartgranti:
    'Clarke, http://www.practicalfishkeeping.co.uk/features/articles/aulonocara-stuartgranti-ngara-mdoka',
  cyphotilapiaGenus: 'Genus account, https://handwiki.org/wiki/Biology:Cyphotilapia',
  cyphotilapiaPolish: 'Hobby page on Cyphotilapia (Polish), https://tommyaquario.pl/tanganika/cyphotilapia-spp',
  cyrtocaraHobby: 'Hobby page, http://users.kent.net/~lisab/Cmoorii.html',
  diagrammaEol: 'FishBase via http://media.eol.org/zh-TW/pages/24833/articles',
  diagrammaMtoto:
    'Simochromis diagramma, Mtoto, https://tanganyika.si/TanganjikaByLocations/Mtoto/slides/Simochromis%20diagramma%20%27Mtoto%27.html',
  duboisiEncyclopedia:
    'Encyclopedia article citing IUCN 2006 e.T60704A12395212 and FishBase, https://handwiki.org/wiki/Biology:Tropheus_duboisi',
  duboisiHalembe:
    'Tropheus duboisi, Halembe, https://www.tanganyika.si/Tanganjika/Tropheus/Tropheus%20duboisi/slides/Tropheus%20duboisi%20%27Halembe%27.html',
  duboisiStaeck: 'Dutch cichlid society page, after Staeck, https://nvcweb.nl/node/11630',
  egger2006: 'Egger et al. 2006, Proc R Soc B 273:1797-1802, doi 10.1098/rspb.2006.3504',
  elieson: 'Elieson, Cyrtocara moorii, https://www.cichlid-forum.com/threads/cyrtocara-moorii.455995/',
  enantiopusKarema:
    'Enantiopus melanogenys, Karema, https://tanganyika.si/Tanganjika/Enantiopus/Enantiopus%20melanogenys/slides/Enantiopus%20melanogenys%20%27Karema%27.html',
  ephippiumHalembe:
    'Congener P. ephippium, Halembe, https://tanganyika.si/TanganjikaByLocations/Halembe/slides/Petrochromis%20ephippium%20%27Halembe%27.html',
  eretmodusSociety:
    'Aquarium society page (German), https://winsener-aquarienverein.de/der-tanganjika-clown-eretmodus-cyanostictus/',
  estheraeArticle: 'Article, http://africancichlids.net/articles/metriaclima_estherae/',
  estheraeEncyclopedia: 'Encyclopedia article, https://en.m.wikipedia.org/wiki/Metriaclima_estherae',
  estheraeMayhem: 'Article, http://www.malawimayhem.com/articles_estherae.shtml',
  estheraeProfile: 'Species profile, https://seriouslyfish.com/species/pseudotropheus-estherae',
  famulaChimba:
    'Petrochromis famula, Chimba, https://tanganyika.si/TanganjikaByLocations/Chimba/slides/Petrochromis%20famula%20%27Chimba%27.html',
  famulaProfile: 'Species profile, https://seriouslyfish.com/species/petrochromis-famula',
  faunce2000: 'Faunce 2000, Env Biol Fish 57:353-361',
  fosu2016: 'Fosu Lagoon 2016 (20-370, mean 78) and Mahin Lagoon (243-1223, mean 344)',
  frontosaEol: 'FishBase and ADW via https://media.eol.org/pages/205327/articles',
  frontosaLusungura:
    'Cyphotilapia frontosa, Lusungura Point, https://tanganyika.si/TanganjikaByLocations/Lusungura%20Point/slides/Cyphotilapia%20frontosa%20%27Lusungura%20Point%27.html',
  grueter2004: 'Grueter & Taborsky 2004, Anim Behav 68:1283-1289',
  haesler2011:
    'Haesler et al. 2011, Behav Ecol, summary at https://improbable.com/2011/06/21/ichthyologys-most-salacious-study/',
  horeiArchive: 'German Tanganyika archive, Ctenochromis horei, https://www.drta-archiv.de/ctenochromis-horei/',
  horeiItalian: 'Hobby article (Italian), https://www.passioneacquari.it/pesce/ctenochromis-horei/',
  horeiSlovak: 'Hobby article (Slovak), https://www.sozo.sk/wp/pressf/ctenochromis-horei/',
  horiiJakobsen:
    "Congener B. horii, Jakobsen's Beach, https://tanganyika.si/Tanganjika/Benthochromis/Benthochromis%20horii/slides/Benthochromis%20horii%20%27Jakobsen%27s%20Beach%27.html",
  horiiLubugwe:
    'Congener B. horii, Lubugwe Bay (Slovene), https://tanganyika.si/TanganjikaByLocations/Lubugwe%20Bay/slides/Benthochromis%20horii%20%27Lubugwe%20Bay%27.html',
  julidochromisEncyclopedia: 'Encyclopedia article (copy), http://en.m.wiki.x.io/wiki/Julidochromis',
  julidochromisSociety:
    'Aquarium society page (German), https://biologische-gesellschaft-linne-hannover.de/nachzucht/julidochromis',
  kellogg1995:
    'Kellogg et al. 1995, Proc R Soc B 260:79-84 (7 Malawi species; all but 2 of 13 broods had several sires)',
  koningsMarlieri: 'Konings, https://www.practicalfishkeeping.co.uk/features/julidochromis-three-way-lovers/',
  labeotropheusSister: 'Sister species L. trewavasae, http://seriouslyfish.com/species/Labeotropheus-trewavasae',
  lagos2020: 'Lagos Lagoon sample of 2020, https://journal.univ-eloued.dz/index.php/ajb/article/view/147',
  leptosomaEncyclopedia: 'Encyclopedia article (copy), Cyprichromis leptosoma, https://wikihandbk.com',
  leptosomaProfile: 'Species profile, https://seriouslyfish.com/species/cyprichromis-leptosoma',
  leptosomaWiki: 'Aquarium wiki, http://www.theaquariumwiki.com/w/index.php?title=Cyprichromis_leptosoma',
  maleriProfile: 'Sister form, https://seriouslyfish.com/species/aulonocara-sp-stuartgranti-maleri',
  marlieriClutches:
    'J. cf. marlieri, Katili (50-75), https://tanganyika.si/Tanganjika/Julidochromis/Julidochromis%20marlieri/slides/Julidochromis%20cf.%20marlieri%20%27Katili%27.html, and Staeck 2012, genus (rarely over 40)',
  marlieriKatili:
    'Julidochromis cf. marlieri, Katili, https://tanganyika.si/Tanganjika/Julidochromis/Julidochromis%20marlieri/slides/Julidochromis%20cf.%20marlieri%20%27Katili%27.html',
  mbenjii:
    'Congener C. mbenjii, Mbenji Island, https://www.malawi.si/Malawi/Haplochromises/Copadichromis/Copadichromis%20mbenjii/slides/Copadichromis%20mbenjii%20%27Mbenji%20Island%27.html',
  miller1997:
    'Miller 1997/2002, society article, https://cichlidae.com/article.php?id=263; holding figure in its Polish version, https://akwarystyka.com.pl/tropheus-duboisi',
  mooriiClutches:
    'https://bio.wikisort.org/animal/it/Animalia/Tropheus_moorii (up to 17) and http://www.aquaticcommunity.com/cichlid/mouthbrooders.php (genus, 5-10)',
  mooriiEncyclopedia:
    'Encyclopedia article (Italian copy) citing FishBase and IUCN, https://bio.wikisort.org/animal/it/Animalia/Tropheus_moorii',
  mooriiProfile: 'Species profile, https://seriouslyfish.com/species/tropheus-moorii',
  mooriiTankList: 'Species list, http://fish.mongabay.com/species/Tropheus_moorii.html',
  mooriiTurkish: 'Hobby article (Turkish), http://akvaryum.com/forum/tropheus_tropheus_moorii_k455009.asp',
  morfittBorleyi:
    'Morfitt, citing Konings, https://www.cichlid-forum.com/threads/copadichromis-borleyi-namalenje.455977/',
  morfittFuelleborni: 'Morfitt, https://www.cichlid-forum.com/threads/labeotropheus-fuelleborni-2.456206/',
  multicolorArticle: 'Article, https://perceptiode.com/Pseudocrenilabrus_multicolor',
  multicolorEncyclopedia: 'Encyclopedia article (copy), https://memim.com/egyptian-mouthbrooder.html',
  multicolorHobby: 'Hobby page, https://www.chasesfishes.net/egyptian-mouthbrooder',
  multicolorHolding:
    'https://perceptiode.com/Pseudocrenilabrus_multicolor (8-12) and https://nl.frwiki.wiki/wiki/Pseudocrenilabrus_multicolor_multicolor (15-21)',
  multicolorProfile: 'Species profile, http://seriouslyfish.com/species/pseudocrenilabrus-multicolor',
  nelissen1975:
    'Nelissen 1975, Kuwamura 1986, Poll 1956 and Herrmann 1987 as reported at http://enjoycichlid.com/html/book/t-book/9205_8.html',
  nevado2011:
    'Nevado et al. 2011; egg size of congener O. nasuta, http://enjoycichlid.com/html/book/t-book/9208_6.html',
  nigripinnisEncyclopedia:
    'Encyclopedia article (German copy), https://kampuspedia.com/de/Paracyprichromis_nigripinnis',
  nyerereiEncyclopedia: 'Encyclopedia article (copy), https://dept.abcdef.wiki/wiki/Haplochromis_nyererei',
  ogidiaka2022: 'Ogidiaka et al. 2022, doi 10.30564/jfsr.v4i1.4255',
  parker1996: 'Parker & Kornfield 1996, Env Biol Fish 47:345-352, https://malawicichlids.com/_popup_abs_pk96.htm',
  petrochromisGenus: 'Genus account (German copy), https://de.wiki.li/Petrochromis',
  pseudocrenilabrusGenus: 'Article on the genus, http://wetwebmedia.com/FWSubWebIndex/pseudocrenilabrus.htm',
  pulcherDaffodil: 'Article, https://aquainfo.org/article/neolamprologus-pulcher-daffodil/',
  pulcherFactsheet: 'Aquarium society factsheet, https://www.stroodaquarist.co.uk/factsheets/factsheet-14/',
  pulcherProfile: 'Species profile (as N. pulcher), https://seriouslyfish.com/species/neolamprologus-brichardi',
  sefc2009: 'Sefc, Hermann & Koblmüller 2009, data doi 10.5061/dryad.1267',
  smith2000: 'Congener C. chrysonotus: Smith 2000, African Zoology 35:151-164',
  staeck2012:
    'Staeck 2012 (genus), http://www.fishchannel.com/freshwater-aquariums/fish-breeding/breeding-julidochromis.aspx',
  steeves2006: 'Steeves 2006, genus review, https://cichlidae.com/section.php?id=121',
  steevesBurtoni:
    'Steeves, Astatotilapia burtoni, https://www.cichlid-forum.com/threads/astatotilapia-burtoni-part-2.455942/',
  stiver2009: 'Stiver et al. 2009, J Fish Biol 74:1129-1135',
  stuartgrantiGerman: 'Article (German), https://aquarienbewohner.de/aulonocara-stuartgranti/',
  stuartgrantiMyFish:
    'Aulonocara stuartgranti (German), http://my-fish.org/fishothek/zierfische/a/aulonocara-stuartgranti-blauer-kaiserbuntbarsch',
  trewavasaeMoliro:
    'Petrochromis trewavasae, Moliro, https://tanganyika.si/TanganjikaByLocations/Moliro/slides/Petrochromis%20trewavasae%20%27Moliro%27.html',
  tricotiArchive: 'German Tanganyika archive, Benthochromis tricoti, https://www.drta-archiv.de/benthochromis-tricoti/',
  ventralisDanish:
    'Danish hobby site (not FishBase.org), http://www.fishbase.dk/fishbase/cichlide/tanganyika/Ophthalmotilapia%20ventralis.asp',
  ventralisDutch: 'Article (Dutch), https://www.tanganyika.nl/ophthalmotilapia-ventralis/',
  ventralisProfile: 'Species profile, https://www.seriouslyfish.com/species/ophthalmotilapia-ventralis/',
  zebraEncyclopedia: 'Encyclopedia article (copy), https://de.zxc.wiki/wiki/Maylandia_zebra',
} as const;
