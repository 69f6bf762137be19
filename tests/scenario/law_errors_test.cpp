#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("horton needs its three parameters in order") {
    CHECK(problems(with_losses("{horton: {}}")) ==
          R"(lane.yaml:5:14: error: 'initial_capacity' is missing from horton
        losses: {horton: {}}
                 ^
    add 'initial_capacity: 3.4 mm/h'
lane.yaml:5:14: error: 'final_capacity' is missing from horton
        losses: {horton: {}}
                 ^
    add 'final_capacity: 3.4 mm/h'
lane.yaml:5:14: error: 'decay' is missing from horton
        losses: {horton: {}}
                 ^
    add 'decay: 4.14 1/h'
)");
    CHECK(problems(with_losses(
              "{horton: {initial_capacity: 6 mm/h, final_capacity: 2 in/h, decay: 4.14 1/h}}")) ==
          R"(lane.yaml:5:65: error: final_capacity (2 in/h) is above initial_capacity (6 mm/h)
        losses: {horton: {initial_capacity: 6 mm/h, final_capacity: 2 in/h, decay: 4.14 1/h}}
                                                                    ^
    capacity falls from the initial to the final one; exchange them
)");
    CHECK(problems(with_losses(
              "{horton: {initial_capacity: -6 mm/h, final_capacity: 2 mm, decay: 4.14}}")) ==
          R"(lane.yaml:5:41: error: initial_capacity: '-6 mm/h' is below zero
        losses: {horton: {initial_capacity: -6 mm/h, final_capacity: 2 mm, decay: 4.14}}
                                            ^
    write zero or more
lane.yaml:5:66: error: final_capacity: 'mm' is not a unit of rate
        losses: {horton: {initial_capacity: -6 mm/h, final_capacity: 2 mm, decay: 4.14}}
                                                                     ^
    write a number with a unit, such as '3.4 mm/h' (units: mm/h, in/h, in/hr, cm/h, mm/min, um/s and the like)
lane.yaml:5:79: error: decay: '4.14' has no unit
        losses: {horton: {initial_capacity: -6 mm/h, final_capacity: 2 mm, decay: 4.14}}
                                                                                  ^
    write a number with a unit, such as '4.14 1/h' (units: 1/h, 1/hr, 1/min, 1/s, 1/d)
)");
    CHECK(problems(with_losses("{horton: {initial_capacity: 6 mm/h, final_capacity: 2 mm/h, decay: "
                               "4.14 1/h, recovery: -0.1 1/h}}")) ==
          R"(lane.yaml:5:100: error: recovery: '-0.1 1/h' is below zero
    ...horton: {initial_capacity: 6 mm/h, final_capacity: 2 mm/h, decay: 4.14 1/h, recovery: -0.1 1/h}}
                                                                                             ^
    write zero or more
)");
    CHECK(problems(with_losses("{horton: {initial_capacity: 6 mm/h, final_capacity: 2 mm/h, decay: "
                               "4.14 1/h, recovery: 0 1/h, follows: elapsed_time}}")) ==
          R"(lane.yaml:5:100: error: recovery does not go with elapsed_time
    ...acity: 6 mm/h, final_capacity: 2 mm/h, decay: 4.14 1/h, recovery: 0 1/h, follows: elapsed_time}}
                                                                         ^
    capacity that follows the clock never recovers: take recovery out, or write 'follows: infiltrated_depth'
)");
    CHECK(problems(with_losses("{horton: {initial_capacity: 6 mm/h, final_capacity: 2 mm/h, decay: "
                               "4.14 1/h, follows: elapsed-time}}")) ==
          R"(lane.yaml:5:99: error: follows: 'elapsed-time' is not a choice here
    ...ton: {initial_capacity: 6 mm/h, final_capacity: 2 mm/h, decay: 4.14 1/h, follows: elapsed-time}}
                                                                                         ^
    did you mean 'elapsed_time'?
)");
}

TEST_CASE("green_ampt takes suction and deficit, or their product") {
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h}}")) ==
          R"(lane.yaml:5:14: error: green_ampt needs wetting_front_suction and moisture_deficit
        losses: {green_ampt: {effective_conductivity: 3 mm/h}}
                 ^
    add 'wetting_front_suction: 110 mm' and 'moisture_deficit: 0.2', or their product as 'suction_deficit: 22 mm'
)");
    CHECK(problems(with_losses(
              "{green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm}}")) ==
          R"(lane.yaml:5:14: error: 'moisture_deficit' is missing from green_ampt
        losses: {green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm}}
                 ^
    add 'moisture_deficit: 0.2'
)");
    CHECK(problems(with_losses(
              "{green_ampt: {effective_conductivity: 3 mm/h, moisture_deficit: 0.2}}")) ==
          R"(lane.yaml:5:14: error: 'wetting_front_suction' is missing from green_ampt
        losses: {green_ampt: {effective_conductivity: 3 mm/h, moisture_deficit: 0.2}}
                 ^
    add 'wetting_front_suction: 110 mm'
)");
    CHECK(
        problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 22 "
                             "mm, moisture_deficit: 0.2}}")) ==
        R"(lane.yaml:5:59: error: suction_deficit stands for wetting_front_suction times moisture_deficit, which are given too
    ...s: {green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 22 mm, moisture_deficit: 0.2}}
                                                        ^
    keep the product alone, or the two alone
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, "
                               "wetting_front_suction: -110 mm, moisture_deficit: 1.2}}")) ==
          R"(lane.yaml:5:82: error: wetting_front_suction: '-110 mm' is below zero
    ...n_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: -110 mm, moisture_deficit: 1.2}}
                                                                       ^
    write zero or more
lane.yaml:5:109: error: moisture_deficit: '1.2' is not between 0 and 1
    ...n_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: -110 mm, moisture_deficit: 1.2}}
                                                                                                  ^
    write a plain number from 0 to 1, such as 0.2
)");
    CHECK(
        problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: "
                             "110 mm, moisture_deficit: 20 %}}")) ==
        R"(lane.yaml:5:108: error: moisture_deficit: '20 %' has a unit where a plain number belongs
    ...n_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 20 %}}
                                                                                                 ^
    write 0.20
)");
    CHECK(problems(with_losses(
              "{green_ampt: {wetting_front_suction: 110 mm, moisture_deficit: 0.2}}")) ==
          R"(lane.yaml:5:14: error: 'effective_conductivity' is missing from green_ampt
        losses: {green_ampt: {wetting_front_suction: 110 mm, moisture_deficit: 0.2}}
                 ^
    add 'effective_conductivity: 3.4 mm/h'
)");
}

TEST_CASE("a barrier needs a storage limit, and neither is below zero") {
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 22 "
                               "mm, barrier_rate: 1 mm/h}}")) ==
          R"(lane.yaml:5:83: error: barrier_rate acts only with a storage_limit
    ...es: {green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 22 mm, barrier_rate: 1 mm/h}}
                                                                                 ^
    add 'storage_limit: 60 mm', the pore space above the barrier
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 22 "
                               "mm, storage_limit: 0 mm, barrier_rate: -1 mm/h}}")) ==
          R"(lane.yaml:5:118: error: barrier_rate: '-1 mm/h' is below zero
    ...ctive_conductivity: 3 mm/h, suction_deficit: 22 mm, storage_limit: 0 mm, barrier_rate: -1 mm/h}}
                                                                                              ^
    write zero or more
)");
}

TEST_CASE("the smaller laws check their parameters") {
    CHECK(problems(with_losses("{philip: {}}")) ==
          R"(lane.yaml:5:14: error: 'sorptivity' is missing from philip
        losses: {philip: {}}
                 ^
    add 'sorptivity: 12 mm/h^0.5'
lane.yaml:5:14: error: 'steady_term' is missing from philip
        losses: {philip: {}}
                 ^
    add 'steady_term: 3.4 mm/h'
)");
    CHECK(problems(with_losses("{philip: {sorptivity: -3 mm/h^0.5, steady_term: 2}}")) ==
          R"(lane.yaml:5:35: error: sorptivity: '-3 mm/h^0.5' is below zero
        losses: {philip: {sorptivity: -3 mm/h^0.5, steady_term: 2}}
                                      ^
    write zero or more
lane.yaml:5:61: error: steady_term: '2' has no unit
        losses: {philip: {sorptivity: -3 mm/h^0.5, steady_term: 2}}
                                                                ^
    write a number with a unit, such as '3.4 mm/h' (units: mm/h, in/h, in/hr, cm/h, mm/min, um/s and the like)
)");
    CHECK(problems(with_losses("{constant_rate: {initial_loss: -3 mm}}")) ==
          R"(lane.yaml:5:14: error: 'rate' is missing from constant_rate
        losses: {constant_rate: {initial_loss: -3 mm}}
                 ^
    add 'rate: 3.4 mm/h'
lane.yaml:5:44: error: initial_loss: '-3 mm' is below zero
        losses: {constant_rate: {initial_loss: -3 mm}}
                                               ^
    write zero or more
)");
    CHECK(problems(with_losses("{phi_index: {observed_excess: -1 mm}}")) ==
          R"(lane.yaml:5:43: error: observed_excess: '-1 mm' is below zero
        losses: {phi_index: {observed_excess: -1 mm}}
                                              ^
    write zero or more
)");
    CHECK(problems(with_losses("{phi_index: {}}")) ==
          R"(lane.yaml:5:14: error: 'observed_excess' is missing from phi_index
        losses: {phi_index: {}}
                 ^
    add 'observed_excess: 12.5 mm'
)");
}

TEST_CASE("a curve number is above 0 and up to 100, and can be computed with") {
    CHECK(problems(with_losses("{curve_number: {}}")) ==
          R"(lane.yaml:5:14: error: 'number' is missing from curve_number
        losses: {curve_number: {}}
                 ^
    add 'number: 89'
)");
    CHECK(problems(with_losses("{curve_number: {number: 0}}")) ==
          R"(lane.yaml:5:37: error: number: '0' is not above 0 and up to 100
        losses: {curve_number: {number: 0}}
                                        ^
    write a plain number above 0 and up to 100, such as 89
)");
    CHECK(problems(with_losses("{curve_number: {number: 100.5}}")) ==
          R"(lane.yaml:5:37: error: number: '100.5' is not above 0 and up to 100
        losses: {curve_number: {number: 100.5}}
                                        ^
    write a plain number above 0 and up to 100, such as 89
)");
    CHECK(problems(with_losses("{curve_number: {number: -3}}")) ==
          R"(lane.yaml:5:37: error: number: '-3' is below zero
        losses: {curve_number: {number: -3}}
                                        ^
    write a plain number above 0 and up to 100, such as 89
)");
    CHECK(problems(with_losses("{curve_number: {number: 80 mm}}")) ==
          R"(lane.yaml:5:37: error: number: '80 mm' has a unit where a plain number belongs
        losses: {curve_number: {number: 80 mm}}
                                        ^
    write a plain number above 0 and up to 100, such as 89
)");
    CHECK(problems(with_losses("{curve_number: {number: eighty}}")) ==
          R"(lane.yaml:5:37: error: number: 'eighty' is not a number
        losses: {curve_number: {number: eighty}}
                                        ^
    write a plain number above 0 and up to 100, such as 89
)");
    CHECK(problems(with_losses("{curve_number: {number: 1e-300}}")) ==
          R"(lane.yaml:5:37: warning: a curve number of 1e-300, under 40
        losses: {curve_number: {number: 1e-300}}
                                        ^
    the method answers poorly there: look for measured losses instead
lane.yaml:5:37: error: number: '1e-300' is too small to compute with: its retention is beyond 1e12 mm
        losses: {curve_number: {number: 1e-300}}
                                        ^
    curve numbers stand between 30 and 100
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, antecedent: 2}}")) ==
          R"(lane.yaml:5:53: error: antecedent: '2' is not a choice here
        losses: {curve_number: {number: 80, antecedent: 2}}
                                                        ^
    here it is called 'II'
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, antecedent: IV}}")) ==
          R"(lane.yaml:5:53: error: antecedent: 'IV' is not a choice here
        losses: {curve_number: {number: 80, antecedent: IV}}
                                                        ^
    known here: I, II, III
)");
}

TEST_CASE("ratios are shares of one with a published conversion") {
    CHECK(problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 1.2}}")) ==
          R"(lane.yaml:5:68: error: initial_abstraction_ratio: '1.2' is not between 0 and 1
        losses: {curve_number: {number: 80, initial_abstraction_ratio: 1.2}}
                                                                       ^
    write a plain number from 0 to 1, such as 0.2
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, tabulated_ratio: 0.1}}")) ==
          R"(lane.yaml:5:58: error: no conversion is published from a tabulated ratio of 0.1
        losses: {curve_number: {number: 80, tabulated_ratio: 0.1}}
                                                             ^
    it is 0.2, or the initial_abstraction_ratio itself for no conversion
)");
    CHECK(
        problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 0.1, "
                             "tabulated_ratio: 0.2}}")) ==
        R"(lane.yaml:5:90: error: the conversion from a tabulated ratio of 0.2 is published for an initial_abstraction_ratio of 0.05 alone
        losses: {curve_number: {number: 80, initial_abstraction_ratio: 0.1, tabulated_ratio: 0.2}}
                                                                                             ^
    write 'initial_abstraction_ratio: 0.05', or leave tabulated_ratio out
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 0.05, "
                               "tabulated_ratio: -1}}")) ==
          R"(lane.yaml:5:91: error: tabulated_ratio: '-1' is not between 0 and 1
        losses: {curve_number: {number: 80, initial_abstraction_ratio: 0.05, tabulated_ratio: -1}}
                                                                                              ^
    write a plain number from 0 to 1, such as 0.2
)");
}

TEST_CASE("numbers too small to compute with") {
    CHECK(
        problems(with_losses("{horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: "
                             "1e-308 1/h}}")) ==
        R"(lane.yaml:5:81: error: decay: '1e-308 1/h' is too small to compute with
        losses: {horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 1e-308 1/h}}
                                                                                    ^
    write 0, or check the number and its unit
)");
}

}  // namespace rainledger
