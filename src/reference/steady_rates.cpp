#include "rainledger/reference/steady_rates.hpp"

#include <array>

#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

constexpr Provenance kFao{&sources::kFao5, "annex 2", Status::confirmed,
                          "in a page that quotes the annex"};
constexpr Provenance kFaoSand{&sources::kFao5, "annex 2", Status::from_memory};
constexpr Provenance kHillel{
    &sources::kHillel1980, "steady infiltration rates", Status::confirmed,
    "in a lecture slide, under the names sand, sandy loam, silt, clay, alkali clay"};
constexpr Provenance kTideman{&sources::kTideman1996, "classes of infiltration rate",
                              Status::confirmed, "in a university glossary"};

constexpr std::optional<double> kOpen = std::nullopt;

constexpr std::array kRows = std::to_array<SteadyRateRow>({
    {"sand", 30.0, kOpen, kFaoSand},
    {"sandy loam", 20.0, 30.0, kFao},
    {"loam", 10.0, 20.0, kFao},
    {"clay loam", 5.0, 10.0, kFao},
    {"clay", 1.0, 5.0, kFao},
    {"sands", 20.0, kOpen, kHillel},
    {"sandy and silty soils", 10.0, 20.0, kHillel},
    {"loams", 5.0, 10.0, kHillel},
    {"clayey soils", 1.0, 5.0, kHillel},
    {"sodic clayey soils", kOpen, 1.0, kHillel},
    {"low rate", kOpen, 15.0, kTideman},
    {"medium rate", 15.0, 50.0, kTideman},
    {"high rate", 50.0, kOpen, kTideman},
});

}  // namespace

std::span<const SteadyRateRow> steady_rate_rows() {
    return kRows;
}

RowView view_of(const SteadyRateRow& row) {
    return {std::string(row.name),
            {{"low_mm_per_h",
              row.high_mm_per_h ? "from" : "more than",
              Dimension::rate,
              "mm/h",
              {row.low_mm_per_h, {}}},
             {"high_mm_per_h",
              row.low_mm_per_h ? "to" : "less than",
              Dimension::rate,
              "mm/h",
              {row.high_mm_per_h, {}}}},
            {},
            row.provenance};
}

}  // namespace rainledger
