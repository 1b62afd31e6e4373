/** Invented names: Ellmark's surveyors come from many places. Names are combined at random; no real person is meant. */
import type { Chance } from './random';

interface Origin {
  /** ISO 639-1 code of the language a person of this origin may have grown up with. */
  language: string;
  first: readonly string[];
  last: readonly string[];
  weight: number;
}

const words = (text: string): string[] => text.split(' ');

const ORIGINS: readonly Origin[] = [
  {
    language: 'en',
    weight: 30,
    first: words(
      'Edith Tom Martha Gareth Imogen Alec Hester Rowan Philippa Duncan Maud Jasper Winifred Colin Beatrix Miles Nell Hugh Tabitha Angus Judith Ewan Cressida Ned Harriet Piers Lorna Clive Agnes Barnaby',
    ),
    last: words(
      'Ashdown Thackeray-Lowe Penhallow Bramwell Tregarth Wexcombe Fairweather Hollis Garside Marlowe-Finch Pettigrew Standish Yarrow Lockwood Birtles Casterton Dunmore Eddowes Fothergill Greaves Hathersage Ingleby Kettlewell Lyddon Merriman Netherby Oxley Prowse Quayle Rudge Sedgwick Threlkeld',
    ),
  },
  {
    language: 'da',
    weight: 18,
    first: words(
      'Asta Bjarke Cæcilie Ditte Esben Frøya Gorm Hjørdis Ingvar Jørgen Kirstine Leif Mette Njord Oddny Ragnhild Sigurd Torben Ulrikke Villads',
    ),
    last: words(
      'Aagaard Bergstrøm Dalgård Elvestad Fjeldsø Grønlund Haugen Iversø Kjær Lindqvist Mørk Nordhavn Østergård Rask-Holm Skovbo Thorsgård Vestervik Ødegård',
    ),
  },
  {
    language: 'ga',
    weight: 5,
    first: words('Aoife Bríd Cillian Éamonn Fionnuala Gráinne Iarla Niamh Oisín Ruairí Sorcha Tadhg'),
    last: words("O'Shea O'Dowd Ní_Bhriain Mac_Giolla D'Arcy O'Grady Ó_Murchadha Heffernan O'Leary-Quinn Breathnach"),
  },
  {
    language: 'pl',
    weight: 7,
    first: words('Agnieszka Bartłomiej Cecylia Dobrosława Grażyna Jędrzej Katarzyna Łucja Mieszko Oskar Paweł Żaneta'),
    last: words(
      'Brzozowy Dąbrówka Gołębski Jabłonek Krzyżak Łącki Młynarczyk Śliwiński Wątroba Zabłotny Żurek Ostrowiec',
    ),
  },
  {
    language: 'tr',
    weight: 5,
    first: words('Aylin Burak Çağla Deniz Emre Gülşen Hakan İpek Kerem Nazlı Şule Umut'),
    last: words('Akıncı Bostancı Çelikkol Demirtaş Erbaş Gökçe Kızılırmak Özbudak Şenyuva Taşkıran Ünver Yıldızhan'),
  },
  {
    language: 'ig',
    weight: 4,
    first: words('Adaeze Chidubem Ebele Ifeoma Kosisochukwu Nneka Obinna Somadina Uchechi Zikora'),
    last: words('Anozie Chukwuma Ekwueme Igboanugo Mbanefo Nwafor Obiora Okonjo-Bell Ugwuanyi Umeadi'),
  },
  {
    language: 'yo',
    weight: 3,
    first: words('Abíọ́dún Bọ́láńlé Fẹ́mi Ìyábọ̀ Ṣadé Táíwò Yẹ́misí Kọ́ládé'),
    last: words('Adélékè Akínwándé Bámgbóṣé Fáṣọlá Ògúndélé Ọlátúnjí Oyèníyì'),
  },
  {
    language: 'hi',
    weight: 6,
    first: words('Ananya Bhavesh Devika Gaurav Ishani Kabir Meenal Nikhil Pallavi Raghav Sarita Tarun'),
    last: words(
      'Bhattarai Chaudhuri Deshmukh Gadgil Iyengar Joglekar Kulkarni Mahadevan Nambiar Pillai Rathore Sahasrabudhe',
    ),
  },
  {
    language: 'vi',
    weight: 4,
    first: words('Ánh Bảo Châu Đức Hạnh Khánh Linh Ngọc Phúc Quỳnh Thảo Vĩnh'),
    last: words('Bùi Đặng Đỗ Hồ Huỳnh Lê Nguyễn Phạm Trần Võ'),
  },
  {
    language: 'es',
    weight: 5,
    first: words('Águeda Baltasar Concepción Íñigo Jimena Lucía Maximiliano Nuria Óscar Ximena'),
    last: words('Arístegui Bañuelos Cárdenas Echeverría Güell Ibáñez Lozano Muñiz Peñalver Quiñones Ordóñez'),
  },
  {
    language: 'pt',
    weight: 4,
    first: words('Assunção Bento Conceição Duarte Estêvão Graça Inês João Leonor Tomás'),
    last: words('Abrunhosa Brandão Câmara Falcão Gonçalo Leitão Magalhães Noronha Patrício Simões'),
  },
  {
    language: 'is',
    weight: 3,
    first: words('Ásdís Birna Eyþór Guðlaug Hallgrímur Ísold Kári Rúnar Sóley Þórdís'),
    last: words('Arnardóttir Bjarnason Egilsdóttir Grettisson Hákonardóttir Kjartansson Steinsdóttir Þorkelsson'),
  },
  {
    language: 'cs',
    weight: 4,
    first: words('Božena Čeněk Hynek Jiřina Květa Lubomír Otakar Růžena Štěpán Zdeňka'),
    last: words('Březina Černoch Dvořáček Hřebíková Jirásek Koutný Ouředník Řezáč Šimůnek Žďárská'),
  },
  {
    language: 'ar',
    weight: 5,
    first: words('Abeer Bilal Dalal Fadi Ghada Hisham Jumana Khalil Lubna Nabil Rania Tariq'),
    last: words('Al-Khatib Barakat El-Sayegh Ghanem Haddad-Noor Khoury Mansour Nasrallah-Bey Qabbani Saadeh Tabbara'),
  },
  {
    language: 'fi',
    weight: 4,
    first: words('Aino Eero Hilja Jyrki Kaisa Lauri Mirja Päivi Seppo Tuomas Väinö Yrjö'),
    last: words('Hämäläinen Järvelä Kärkkäinen Lehtimäki Mäkisalo Niittymäki Pöyhönen Ruohomäki Sääskilahti Ylönen'),
  },
  {
    language: 'el',
    weight: 3,
    first: words('Anthi Danae Fotis Ilias Kyveli Lefteris Myrto Pavlos Stamatia Thaleia'),
    last: words('Anagnostou Delivorias Galanopoulou Kalogeras Mavromati Papavasiliou Sarantakos Tsoukalas Vlachou'),
  },
  {
    language: 'nl',
    weight: 4,
    first: words('Anouk Bram Daphne Floris Geertje Jurre Liselotte Maarten Reinier Wouter'),
    last: words(
      'van_der_Aalst de_Boomgaard ten_Brinke van_Duinen Eijkelkamp Hoogland Kuipers-Veen van_’t_Zand Westerveld IJsselmuiden',
    ),
  },
  {
    language: 'am',
    weight: 3,
    first: words('Abebech Biruk Dawit Eleni Genet Hirut Mulugeta Selamawit Tesfaye Yohannes'),
    last: words('Alemayehu Bekele-Wolde Demissie Gebreselassie Haileyesus Kidane Mengistu-Ayele Tadesse Woldemariam'),
  },
  {
    language: 'id',
    weight: 3,
    first: words(
      'Suhartini Wicaksono Kusumawati Budiarjo Ratnaningsih Setiabudi Nurhasanah Prasetya Indriyani Handoko',
    ),
    last: [''],
  },
  {
    language: 'zh',
    weight: 4,
    first: words('Meilin Jianhong Xiaowen Zhiyuan Lihua Ruoxi Haoran Yating Shufen Weijie'),
    last: words('Ouyang Liang Zhuang Fang Qiu Shen Tao Xue Bai Kong'),
  },
];

const SHE = new Set([
  ...words(
    'Edith Martha Imogen Hester Philippa Maud Winifred Beatrix Nell Tabitha Judith Cressida Harriet Lorna Agnes',
  ),
  ...words('Asta Cæcilie Ditte Frøya Hjørdis Kirstine Mette Oddny Ragnhild Ulrikke'),
  ...words('Agnieszka Cecylia Dobrosława Grażyna Katarzyna Łucja Żaneta Aino Hilja Kaisa Mirja Päivi'),
]);
const HE = new Set([
  ...words('Tom Gareth Alec Duncan Jasper Colin Miles Hugh Angus Ewan Ned Piers Clive Barnaby'),
  ...words('Bjarke Esben Gorm Ingvar Jørgen Leif Njord Sigurd Torben Villads'),
  ...words('Bartłomiej Jędrzej Mieszko Oskar Paweł Eero Jyrki Lauri Seppo Tuomas Väinö Yrjö'),
]);

/** Pronouns for some names; most people leave the field empty. */
export function drawPronouns(luck: Chance, name: string): string {
  const first = name.split(' ')[0] ?? '';
  if (luck.happens(0.015)) return 'they/them';
  if (!luck.happens(0.45)) return '';
  return SHE.has(first) ? 'she/her' : HE.has(first) ? 'he/him' : '';
}

export interface DemoName {
  name: string;
  /** Language of origin, ISO 639-1. */
  language: string;
}

/** A name; now and then one of the second half is of another origin, and Indonesian names may be a single word. */
export function drawName(luck: Chance): DemoName {
  const origin = luck.pickWeighted(ORIGINS.map((each) => [each, each.weight] as const));
  const family = luck.happens(0.06) ? luck.pickWeighted(ORIGINS.map((each) => [each, each.weight] as const)) : origin;
  const first = luck.pick(origin.first);
  const last = luck.pick(family.last).replaceAll('_', ' ');
  return { name: `${first} ${last}`.trim().normalize('NFC'), language: origin.language };
}

const NOT_DECOMPOSED: Record<string, string> = {
  ø: 'o',
  æ: 'ae',
  œ: 'oe',
  ß: 'ss',
  ł: 'l',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ı: 'i',
};

/** Lower-case ASCII letters and digits with single dots: `Þórdís O'Shea` → `thordis.oshea`. */
export function asciiMailName(name: string): string {
  return name
    .toLowerCase()
    .normalize('NFD')
    .replaceAll(/\p{M}/gu, '')
    .replaceAll(/[øæœßłđðþı]/g, (letter) => NOT_DECOMPOSED[letter] ?? '')
    .replaceAll(/['’]/g, '')
    .replaceAll(/[^a-z0-9]+/g, '.')
    .replaceAll(/^\.|\.$/g, '');
}
