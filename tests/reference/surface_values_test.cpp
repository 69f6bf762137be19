#include <limits>

#include "rainledger/reference/horton_values.hpp"
#include "rainledger/reference/interception_values.hpp"
#include "rainledger/reference/names.hpp"
#include "rainledger/reference/steady_rates.hpp"
#include "rainledger/reference/storage_values.hpp"
#include "test.hpp"

// Published values for the surface: Horton's parameters, storage, interception, steady rates.
namespace rainledger {
namespace {

constexpr double kNone = std::numeric_limits<double>::quiet_NaN();

const HortonRow& horton_row(std::string_view name) {
    const auto rows = rows_named(horton_rows(), name);
    REQUIRE(rows.size() == 1);
    return *rows.front();
}

const InterceptionRow& interception_row(std::string_view name) {
    const auto rows = rows_named(interception_rows(), name);
    REQUIRE(rows.size() == 1);
    return *rows.front();
}

}  // namespace

TEST_CASE("names of Horton's rows are unique, and a law has its capacities in order") {
    CHECK(names_of(horton_rows()).size() == horton_rows().size());
    int laws = 0;
    for (const HortonRow& row : horton_rows()) {
        if (!row.makes_a_law()) continue;
        ++laws;
        INFO(row.name);
        CHECK(*row.initial_capacity_mm_per_h.value > *row.final_capacity_mm_per_h.value);
        CHECK(*row.decay_per_h.value > 0.0);
    }
    CHECK(laws == 14);  // ten soils of Georgia and four groups of the manual
}

TEST_CASE("parts that a source does not give stay empty") {
    const HortonRow& akan = horton_row("Loam, dry, dense vegetation");
    CHECK(*akan.initial_capacity_mm_per_h.value == 6.0 * 25.4);
    CHECK_FALSE(akan.final_capacity_mm_per_h.value);
    CHECK_FALSE(akan.decay_per_h.value);
    CHECK_FALSE(akan.makes_a_law());
    const HortonRow& peat = horton_row("peat");
    CHECK_FALSE(peat.final_capacity_mm_per_h.value);
    CHECK(peat.final_capacity_mm_per_h.range->low == 2.0);
    CHECK_FALSE(peat.makes_a_law());
}

TEST_CASE("the soils of Georgia warn of the unit of their decay") {
    for (const HortonRow* row : rows_mentioning(horton_rows(), "loamy sand"))
        CHECK_THAT(std::string(row->note), Contains("1/h is taken"));
    CHECK(rows_mentioning(horton_rows(), "loamy sand").size() == 8);
    const RowView view = view_of(horton_row("dothan loamy sand"));
    REQUIRE(view.values.size() == 3);
    CHECK(view.values[2].printed_unit == "1/h");
    CHECK(view.notes.size() == 1);
}

TEST_CASE("recommended depths lie in their ranges") {
    for (const StorageRow& row : storage_rows()) {
        INFO(row.name);
        CHECK((row.depth_mm.value || row.depth_mm.range));
        if (row.depth_mm.range) CHECK(row.depth_mm.range->low < row.depth_mm.range->high);
        if (!row.depth_mm.value || !row.depth_mm.range) continue;
        CHECK(*row.depth_mm.value >= row.depth_mm.range->low);
        CHECK(*row.depth_mm.value <= row.depth_mm.range->high);
    }
}

TEST_CASE("a surface that several sources hold is found in all of them") {
    const auto rows = rows_named(storage_rows(), "Impervious");
    CHECK(rows.size() == 3);
    CHECK(rows_mentioning(storage_rows(), "roof").size() == 2);
    const RowView view = view_of(*rows.front());
    REQUIRE(view.values.size() == 1);
    CHECK(view.values[0].key == "depression_storage_mm");
    CHECK(view.values[0].label == "depression storage");
    const RowView turf = view_of(*rows_named(storage_rows(), "lawn and turf").front());
    CHECK(turf.values[0].key == "surface_retention_mm");
}

TEST_CASE("a paved slope holds less the steeper it is") {
    CHECK(*paved_depression_storage_mm(0.5).value > *paved_depression_storage_mm(3.0).value);
    for (const double slope : {0.0, -1.0, kNone, std::numeric_limits<double>::infinity()})
        CHECK(paved_depression_storage_mm(slope).problem ==
              "the slope must be above 0, and finite");
}

TEST_CASE("interception never holds more than the rain") {
    const InterceptionRow& oak = interception_row("oak woods");
    CHECK(*interception_mm(oak, 0.0).value == 0.0);
    CHECK(*interception_mm(oak, 1.0).value == 1.0);
    CHECK_THAT(*interception_mm(oak, 25.4).value, WithinRel(0.23 * 25.4, 1e-12));
}

TEST_CASE("a crop holds in proportion to its height") {
    const InterceptionRow& alfalfa = interception_row("alfalfa");
    const double at_1_ft = *interception_mm(alfalfa, 25.4, 304.8).value;
    CHECK_THAT(at_1_ft, WithinRel(0.11 * 25.4, 1e-12));
    CHECK_THAT(*interception_mm(alfalfa, 25.4, 609.6).value, WithinRel(2.0 * at_1_ft, 1e-12));
}

TEST_CASE("interception refuses what its formula cannot take") {
    const InterceptionRow& corn = interception_row("corn");
    const InterceptionRow& pine = interception_row("hemlock and pine");
    CHECK(interception_mm(pine, -1.0).problem == "the rain must be 0 or more, and finite");
    CHECK(interception_mm(pine, kNone).problem == "the rain must be 0 or more, and finite");
    CHECK(interception_mm(pine, 10.0, 300.0).problem ==
          "the formula of hemlock and pine takes no height");
    CHECK(interception_mm(corn, 10.0).problem ==
          "the formula of corn needs the height of the crop");
    CHECK(interception_mm(corn, 10.0, 0.0).problem ==
          "the height of the crop must be above 0, and finite");
    CHECK(view_of(corn).notes[0] ==
          "held: (a + b P^n) h inches, P in inches, h the height in feet");
    CHECK(view_of(pine).notes[0] == "held: a + b P^n inches, P in inches");
}

TEST_CASE("steady rates of one source are steps of one ladder") {
    const auto rows = steady_rate_rows();
    for (std::size_t i = 1; i < rows.size(); ++i) {
        if (rows[i].provenance.source != rows[i - 1].provenance.source) continue;
        INFO(rows[i].name);
        const bool falling = rows[i].high_mm_per_h == rows[i - 1].low_mm_per_h;
        const bool rising = rows[i].low_mm_per_h == rows[i - 1].high_mm_per_h;
        CHECK((falling || rising));
    }
    CHECK(view_of(rows.front()).values[0].label == "more than");
    CHECK(view_of(rows[1]).values[1].label == "to");
}

}  // namespace rainledger
