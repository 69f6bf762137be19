#include "rainledger/reference/soil_group.hpp"

#include <limits>

#include "test.hpp"

namespace rainledger {
namespace {

std::string rated(double conductivity_mm_per_h, std::optional<double> layer_mm,
                  std::optional<double> water_mm) {
    const auto answer = rated_soil({conductivity_mm_per_h, layer_mm, water_mm});
    REQUIRE(answer.value);
    return rating_name(answer.value->rating);
}

}  // namespace

TEST_CASE("a high water table makes a rating dual") {
    CHECK(rated(50.0, 1500.0, 300.0) == "A/D");
    CHECK(rated(20.0, 1500.0, 300.0) == "B/D");
    CHECK(rated(5.0, 1500.0, 300.0) == "C/D");
    CHECK(rated(1.0, 1500.0, 300.0) == "D");
    CHECK(rated(50.0, {}, {}) == "A");
    CHECK(rated(50.0, 700.0, {}) == "B");
    CHECK(rated(500.0, 400.0, {}) == "D");
}

TEST_CASE("a rating names the row and the depth that its conductivity is for") {
    const auto answer = rated_soil({3.4, 800.0, 2000.0});
    REQUIRE(answer.value);
    CHECK(answer.value->row->name ==
          "impermeable layer at 50 to 100 cm, water table at 60 cm or deeper");
    CHECK(answer.value->row->conductivity_depth_mm->high == 500.0);
    CHECK(rating_name(answer.value->rating) == "D");
}

// Slower soils and shallower layers shed more, and no table of groups can say otherwise.
TEST_CASE("a rating never improves with a slower conductivity or a shallower layer") {
    const double depths[] = {100.0, 499.0, 500.0, 1000.0, 1001.0, 3000.0};
    for (const double layer : depths)
        for (const double water : depths) {
            SoilGroup before = SoilGroup::A;
            for (const double conductivity : {200.0, 144.0, 50.0, 36.0, 14.4, 3.6, 1.44, 0.0}) {
                const auto answer = rated_soil({conductivity, layer, water});
                REQUIRE(answer.value);
                CHECK(answer.value->rating.drained >= before);
                CHECK(answer.value->rating.undrained >= answer.value->rating.drained);
                before = answer.value->rating.drained;
                const auto deeper = rated_soil({conductivity, layer + 3000.0, water});
                CHECK(deeper.value->rating.undrained <= answer.value->rating.undrained);
            }
        }
}

TEST_CASE("a profile that cannot be is refused in words") {
    constexpr double kNone = std::numeric_limits<double>::quiet_NaN();
    CHECK(rated_soil({-1.0, {}, {}}).problem == "the conductivity must be 0 or more, and finite");
    CHECK(rated_soil({kNone, {}, {}}).problem == "the conductivity must be 0 or more, and finite");
    CHECK(rated_soil({1.0, -1.0, {}}).problem ==
          "the depth to an impermeable layer must be 0 or more, and finite");
    CHECK(rated_soil({1.0, {}, kNone}).problem ==
          "the depth to the water table must be 0 or more, and finite");
}

TEST_CASE("groups are read forgivingly, dual ones too") {
    const auto read = [](std::string_view typed) {
        const auto answer = parse_soil_group(typed);
        return answer.value ? rating_name(*answer.value) : "none";
    };
    CHECK(read("b") == "B");
    CHECK(read("B/D") == "B/D");
    CHECK(read("c/d") == "C/D");
    CHECK(read("AD") == "A/D");
    CHECK(read("D") == "D");
    CHECK(read("D/D") == "none");
    CHECK(read("B/C") == "none");
    CHECK(parse_soil_group("E").problem == "unknown soil group 'E'");
    CHECK(parse_soil_group("E").hint == "known here: A, B, C, D, A/D, B/D, C/D");
}

TEST_CASE("the key by texture holds every class but silt") {
    for (std::size_t i = 0; i < texture_names().size(); ++i) {
        const auto texture = static_cast<TextureClass>(i);
        CHECK(soil_group_of_texture(texture).has_value() == (texture != TextureClass::silt));
    }
}

TEST_CASE("a row of table 7-1 shows its bounds") {
    CHECK(view_of(soil_group_rows().front()).values.empty());
    CHECK(view_of(soil_group_rows().front()).notes.size() == 1);
    const RowView view = view_of(soil_group_rows()[1]);
    REQUIRE(view.values.size() == 4);
    CHECK(view.values[0].published.range->high == 600.0);
    CHECK(*view.values[1].published.value == 144.0);
    CHECK(view.values[1].printed_unit == "um/s");
    CHECK(view.notes.size() == 1);
}

}  // namespace rainledger
