#include <sstream>

#include "rainledger/base/number.hpp"
#include "rainledger/report/fit_report.hpp"
#include "report/fit_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using sample::shown_of;

std::vector<std::string> lines_of(const std::string& text) {
    std::istringstream stream(text);
    std::vector<std::string> lines;
    for (std::string line; std::getline(stream, line);)
        lines.push_back(line);
    return lines;
}

std::vector<std::string> cells_of(const std::string& line) {
    std::istringstream stream(line + ",");
    std::vector<std::string> cells;
    for (std::string cell; std::getline(stream, cell, ',');)
        cells.push_back(cell);
    return cells;
}

FieldFitOptions only(std::vector<FieldLaw> laws) {
    FieldFitOptions options;
    options.laws = std::move(laws);
    return options;
}

}  // namespace

TEST_CASE("the CSV has a row per reading with the fitted values") {
    // F = 20 sqrt(t) + 10 t, two readings for two parameters.
    const auto test = test_of(ReadingKind::infiltrated, {15, 60}, {12.5, 30.0});
    const auto lines = lines_of(fit_csv(shown_of({test}, only({FieldLaw::philip}))));
    REQUIRE(lines.size() == 3);
    CHECK(lines[0] ==
          "pit,reading,end_min,depth_mm,rate_mm_per_h,philip_depth_mm,philip_rate_mm_per_h");
    CHECK(lines[1].starts_with(",1,15,12.5,50,"));
    const auto cells = cells_of(lines[2]);
    REQUIRE(cells.size() == 7);
    CHECK(cells[1] == "2");
    CHECK(cells[2] == "60");
    CHECK_THAT(*parse_number(cells[4]), WithinRel(17.5 / 0.75, 1e-12));
    CHECK_THAT(*parse_number(cells[5]), WithinRel(30.0, 1e-9));
    CHECK_THAT(*parse_number(cells[6]), WithinRel(17.5 / 0.75, 1e-9));
}

TEST_CASE("fitted cells carry the numbers of the fit, to the last bit") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const auto lines = lines_of(fit_csv(shown));
    REQUIRE(lines.size() == 13);
    const LawFit& fit = sample::law_of(shown, FieldLaw::green_ampt);
    const auto cells = cells_of(lines[5]);
    CHECK(cells_of(lines[0])[7] == "green_ampt_depth_mm");
    CHECK(parse_number(cells[7]) == fit.readings[4].fitted_depth_mm);
    CHECK(parse_number(cells[8]) == fit.readings[4].fitted_rate_mm_per_h);
}

TEST_CASE("minutes carry no rounding of hours") {
    const auto test = test_of(ReadingKind::infiltrated, {7, 14, 29, 58, 119}, {5, 9, 16, 29, 55});
    const auto lines = lines_of(fit_csv(shown_of({test})));
    for (const auto& [row, minutes] : {std::pair{1, "7"}, {2, "14"}, {3, "29"}, {5, "119"}})
        CHECK(cells_of(lines[static_cast<std::size_t>(row)])[2] == minutes);
}

TEST_CASE("several pits have their own fit and that of all together") {
    ShownFit shown = sample::three_pits(only({FieldLaw::horton}));
    const auto lines = lines_of(fit_csv(shown));
    REQUIRE(lines.size() == 37);
    CHECK(lines[0] ==
          "pit,reading,end_min,depth_mm,rate_mm_per_h,horton_depth_mm,horton_rate_mm_per_h,"
          "pooled_horton_depth_mm,pooled_horton_rate_mm_per_h");
    const auto cells = cells_of(lines[14]);
    CHECK(cells[0] == "middle");
    CHECK(cells[1] == "2");
    CHECK(parse_number(cells[5]) == shown.fit.pits[1].laws[0].fit->readings[1].fitted_depth_mm);
    CHECK(parse_number(cells[7]) == shown.fit.pooled->laws[0].fit->readings[13].fitted_depth_mm);
}

TEST_CASE("cells of a law that could not be fitted are empty") {
    const auto lines = lines_of(fit_csv(shown_of({sample::dry_pit()}, only({FieldLaw::philip}))));
    CHECK(lines[1] == ",1,10,0,0,,");
}

TEST_CASE("a pit's name that would break the row stands in quotes") {
    const ShownFit shown = shown_of({sample::good_pit("north, \"upper\""), sample::slow_pit("b")},
                                    only({FieldLaw::philip}));
    CHECK(lines_of(fit_csv(shown))[1].starts_with("\"north, \"\"upper\"\"\",1,5,9.1,"));
}

TEST_CASE("readings left out have no row, and the others keep their numbers") {
    FieldFitOptions options = only({FieldLaw::philip});
    options.ignore_first_h = 0.1;
    const auto lines = lines_of(fit_csv(shown_of({sample::good_pit()}, options)));
    REQUIRE(lines.size() == 11);
    CHECK(lines[1].starts_with(",3,15,"));
}

}  // namespace rainledger
