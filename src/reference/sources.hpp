#pragma once

#include <array>

#include "rainledger/reference/provenance.hpp"

// The publications that the tables rest on; docs/references.md says more under the same keys.
namespace rainledger::sources {

inline constexpr Source kRawls1983{"Rawls1983", "Rawls, Brakensiek and Miller",
                                   "Green-Ampt infiltration parameters from soils data", "1983",
                                   "Journal of Hydraulic Engineering 109(1)"};
inline constexpr Source kRawls1982{"Rawls1982", "Rawls, Brakensiek and Saxton",
                                   "Estimation of soil water properties", "1982",
                                   "Transactions of the ASAE 25"};
inline constexpr Source kBouwer1966{"Bouwer1966", "Bouwer",
                                    "Rapid field measurement of air entry value and hydraulic "
                                    "conductivity of soil",
                                    "1966", "Water Resources Research 2(4)"};
inline constexpr Source kRawlsBrakensiek1985{
    "RawlsBrakensiek1985", "Rawls and Brakensiek",
    "Prediction of soil water properties for hydrologic modeling", "1985",
    "ASCE, Watershed Management in the Eighties"};
inline constexpr Source kSaxtonRawls2006{"SaxtonRawls2006", "Saxton and Rawls",
                                         "Soil water characteristic estimates by texture and "
                                         "organic matter for hydrologic solutions",
                                         "2006",
                                         "Soil Science Society of America Journal 70:1569-1578"};
inline constexpr Source kSoilSurveyManual{"SoilSurveyManual", "USDA", "Soil Survey Manual",
                                          "year not recorded", "Handbook 18"};
inline constexpr Source kTr55{"TR55", "USDA NRCS", "Urban Hydrology for Small Watersheds", "1986",
                              "Technical Release 55, 2nd edition"};
inline constexpr Source kBeven{"Beven", "Beven", "Rainfall-Runoff Modelling, The Primer",
                               "year not recorded", "Wiley"};
inline constexpr Source kNeh7{"NEH7", "USDA NRCS",
                              "National Engineering Handbook, Part 630, chapter 7, Hydrologic "
                              "soil groups",
                              "2009", "January 2009"};
inline constexpr Source kNeh10{"NEH10", "USDA NRCS",
                               "National Engineering Handbook, Part 630, chapter 10, Estimation of "
                               "direct runoff from storm rainfall",
                               "2004", ""};
inline constexpr Source kRawls1976{"Rawls1976", "Rawls, Yates and Asmussen",
                                   "Calibration of selected infiltration equations for the "
                                   "Georgia Coastal Plain",
                                   "1976", "USDA-ARS, ARS-S-113"};
inline constexpr Source kAkan1993{"Akan1993", "Akan", "Urban Stormwater Hydrology", "1993", ""};
inline constexpr Source kAkan1992{"Akan1992", "Akan", "Horton infiltration equation revisited",
                                  "1992", "Journal of Irrigation and Drainage Engineering 118"};
inline constexpr Source kMusgrave1955{"Musgrave1955", "Musgrave",
                                      "How much of the rain enters the soil?", "1955",
                                      "USDA Yearbook of Agriculture"};
inline constexpr Source kInfiltrationNotes{"InfiltrationNotes", "author not stated",
                                           "Lecture notes, 4. Infiltration, after Wilson 1990",
                                           "undated", ""};
inline constexpr Source kDrainageManual1984{"DrainageManual1984", "Denver region",
                                            "Drainage Criteria Manual", "1984", "1984 edition"};
inline constexpr Source kMaricopa{"Maricopa", "Maricopa County",
                                  "Hydrologic Design Manual for Maricopa County",
                                  "year not recorded", "chapter on rainfall losses"};
inline constexpr Source kTholinKeifer1960{"TholinKeifer1960", "Tholin and Keifer",
                                          "Hydrology of urban runoff", "1960",
                                          "Transactions of the ASCE 125"};
inline constexpr Source kViessman1967{
    "Viessman1967", "Viessman", "title not recorded; quoted for depression storage", "1967", ""};
inline constexpr Source kSabol1983{"Sabol1983", "Sabol",
                                   "title not recorded; quoted for depression storage", "1983", ""};
inline constexpr Source kHicks1944{"Hicks1944", "Hicks", "A method of computing urban runoff",
                                   "1944", "Transactions of the ASCE 109"};
inline constexpr Source kAsce1992{"ASCE1992", "ASCE and WEF",
                                  "Design and Construction of Urban Stormwater Management Systems",
                                  "1992", "ASCE Manual of Practice 77"};
inline constexpr Source kKidd1978{
    "Kidd1978", "Kidd", "title not recorded; depression storage of paved surfaces", "1978", ""};
inline constexpr Source kHorton1919{"Horton1919", "Horton", "Rainfall interception", "1919",
                                    "Monthly Weather Review 47"};
inline constexpr Source kFao5{"FAO5", "FAO",
                              "Irrigation Water Management, training manual 5, annex 2",
                              "year not recorded", ""};
inline constexpr Source kHillel1980{"Hillel1980", "Hillel",
                                    "title not recorded; steady infiltration rates", "1980", ""};
inline constexpr Source kTideman1996{
    "Tideman1996", "Tideman", "title not recorded; classes of infiltration rate", "1996", ""};

inline constexpr std::array kAll{
    &kRawls1983,
    &kRawls1982,
    &kBouwer1966,
    &kRawlsBrakensiek1985,
    &kSaxtonRawls2006,
    &kSoilSurveyManual,
    &kTr55,
    &kBeven,
    &kNeh7,
    &kNeh10,
    &kRawls1976,
    &kAkan1993,
    &kAkan1992,
    &kMusgrave1955,
    &kInfiltrationNotes,
    &kDrainageManual1984,
    &kMaricopa,
    &kTholinKeifer1960,
    &kViessman1967,
    &kSabol1983,
    &kHicks1944,
    &kAsce1992,
    &kKidd1978,
    &kHorton1919,
    &kFao5,
    &kHillel1980,
    &kTideman1996,
};

}  // namespace rainledger::sources
