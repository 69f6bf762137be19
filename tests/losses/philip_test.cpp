#include "rainledger/losses/philip.hpp"

#include <cmath>

#include "test.hpp"

namespace rainledger {

TEST_CASE("Philip's curve and its law agree") {
    CHECK(philip_capacity(12.0, 4.0, 0.0) == kNever);
    CHECK(philip_cumulative(12.0, 4.0, 0.25) == 7.0);
    CHECK(philip_capacity(12.0, 4.0, 0.25) == 16.0);
    const Philip law{12.0, 4.0};
    Philip::State state = law.start();
    CHECK_THAT(law.advance_at_capacity(state, 0.25), WithinRel(7.0, 1e-15));
    CHECK_THAT(law.advance_at_capacity(state, 0.75), WithinRel(16.0 - 7.0, 1e-14));
    CHECK_THAT(law.time_at_capacity(law.start(), 16.0), WithinRel(0.25, 1e-15));
}

TEST_CASE("Philip below capacity follows infiltrated depth") {
    const Philip law{12.0, 4.0};
    Philip::State state = law.start();
    law.advance_below(state, 7.0, 1.0);  // F = 7 mm, te = 0.25 h
    CHECK_THAT(state.root_te, WithinRel(0.5, 1e-15));
    CHECK(law.time_below(state, 16.5, 1.0) == 0.0);
    CHECK_THAT(law.time_below(state, 10.0, 9.0), WithinRel((12.0 * 1.0 + 4.0 - 7.0) / 10.0, 1e-14));
    CHECK(law.time_below(state, 4.0, 9.0) == kNever);
}

TEST_CASE("Philip without sorptivity is a constant capacity") {
    const Philip law{0.0, 4.0};
    CHECK(law.capacity(law.start()) == 4.0);
    CHECK(philip_ponding_time(0.0, 4.0, 4.0) == kNever);
    CHECK(philip_ponding_time(0.0, 4.0, 4.1) == 0.0);
    CHECK(philip_ponding_time(0.0, 0.0, 1.0) == 0.0);
    Philip::State state = law.start();
    law.advance_below(state, 3.0, 1.0);
    CHECK(law.advance_at_capacity(state, 2.0) == 8.0);
    // No steady term: all is sorption.
    CHECK_THAT(philip_ponding_time(12.0, 0.0, 24.0), WithinRel(12.0 * 0.25 / 24.0, 1e-15));
}

}  // namespace rainledger
