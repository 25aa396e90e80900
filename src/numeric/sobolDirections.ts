/**
 * Direction numbers of Sobol' sequences up to 128 dimensions: S. Joe, F. Y. Kuo, SIAM J. Sci. Comput. 30, 2635 (2008),
 * doi:10.1137/070709359, set new-joe-kuo-6.21201 (https://web.maths.unsw.edu.au/~fkuo/sobol/). The first dimension is van
 * der Corput's sequence and needs none. Terms of the direction numbers:
 *
 * Copyright (c) 2008, Frances Y. Kuo and Stephen Joe. All rights reserved.
 *
 * Redistribution and use in source and binary forms, with or without modification, are permitted provided that the
 * following conditions are met:
 * - Redistributions of source code must retain the above copyright notice, this list of conditions and the following
 *   disclaimer.
 * - Redistributions in binary form must reproduce the above copyright notice, this list of conditions and the following
 *   disclaimer in the documentation and/or other materials provided with the distribution.
 * - Neither the names of the copyright holders nor the names of the University of New South Wales and the University of
 *   Waikato and its contributors may be used to endorse or promote products derived from this software without specific
 *   prior written permission.
 *
 * THIS SOFTWARE IS PROVIDED BY THE COPYRIGHT HOLDERS "AS IS" AND ANY EXPRESS OR IMPLIED WARRANTIES, INCLUDING, BUT NOT
 * LIMITED TO, THE IMPLIED WARRANTIES OF MERCHANTABILITY AND FITNESS FOR A PARTICULAR PURPOSE ARE DISCLAIMED. IN NO EVENT
 * SHALL THE COPYRIGHT HOLDERS BE LIABLE FOR ANY DIRECT, INDIRECT, INCIDENTAL, SPECIAL, EXEMPLARY, OR CONSEQUENTIAL DAMAGES
 * (INCLUDING, BUT NOT LIMITED TO, PROCUREMENT OF SUBSTITUTE GOODS OR SERVICES; LOSS OF USE, DATA, OR PROFITS; OR BUSINESS
 * INTERRUPTION) HOWEVER CAUSED AND ON ANY THEORY OF LIABILITY, WHETHER IN CONTRACT, STRICT LIABILITY, OR TORT (INCLUDING
 * NEGLIGENCE OR OTHERWISE) ARISING IN ANY WAY OUT OF THE USE OF THIS SOFTWARE, EVEN IF ADVISED OF THE POSSIBILITY OF SUCH
 * DAMAGE.
 */
export const sobolDirections = {
  /** Primitive polynomials over GF(2) of dimensions 2, 3, …, all coefficients as bits: 11 = 1011₂ is x³ + x + 1. */
  polynomials: [
    3, 7, 11, 13, 19, 25, 37, 41, 47, 55, 59, 61, 67, 91, 97, 103, 109, 115, 131, 137, 143, 145, 157, 167, 171, 185,
    191, 193, 203, 211, 213, 229, 239, 241, 247, 253, 285, 299, 301, 333, 351, 355, 357, 361, 369, 391, 397, 425, 451,
    463, 487, 501, 529, 539, 545, 557, 563, 601, 607, 617, 623, 631, 637, 647, 661, 675, 677, 687, 695, 701, 719, 721,
    731, 757, 761, 787, 789, 799, 803, 817, 827, 847, 859, 865, 875, 877, 883, 895, 901, 911, 949, 953, 967, 971, 973,
    981, 985, 995, 1001, 1019, 1033, 1051, 1063, 1069, 1125, 1135, 1153, 1163, 1221, 1239, 1255, 1267, 1279, 1293, 1305,
    1315, 1329, 1341, 1347, 1367, 1387, 1413, 1423, 1431, 1441, 1479, 1509,
  ],
  /** Initial odd numbers m₁ … m_s of each dimension in turn, s the degree of its polynomial. */
  initial: [
    1, 1, 3, 1, 3, 1, 1, 1, 1, 1, 1, 3, 3, 1, 3, 5, 13, 1, 1, 5, 5, 17, 1, 1, 5, 5, 5, 1, 1, 7, 11, 19, 1, 1, 5, 1, 1,
    1, 1, 1, 3, 11, 1, 3, 5, 5, 31, 1, 3, 3, 9, 7, 49, 1, 1, 1, 15, 21, 21, 1, 3, 1, 13, 27, 49, 1, 1, 1, 15, 7, 5, 1,
    3, 1, 15, 13, 25, 1, 1, 5, 5, 19, 61, 1, 3, 7, 11, 23, 15, 103, 1, 3, 7, 13, 13, 15, 69, 1, 1, 3, 13, 7, 35, 63, 1,
    3, 5, 9, 1, 25, 53, 1, 3, 1, 13, 9, 35, 107, 1, 3, 1, 5, 27, 61, 31, 1, 1, 5, 11, 19, 41, 61, 1, 3, 5, 3, 3, 13, 69,
    1, 1, 7, 13, 1, 19, 1, 1, 3, 7, 5, 13, 19, 59, 1, 1, 3, 9, 25, 29, 41, 1, 3, 5, 13, 23, 1, 55, 1, 3, 7, 3, 13, 59,
    17, 1, 3, 1, 3, 5, 53, 69, 1, 1, 5, 5, 23, 33, 13, 1, 1, 7, 7, 1, 61, 123, 1, 1, 7, 9, 13, 61, 49, 1, 3, 3, 5, 3,
    55, 33, 1, 3, 1, 15, 31, 13, 49, 245, 1, 3, 5, 15, 31, 59, 63, 97, 1, 3, 1, 11, 11, 11, 77, 249, 1, 3, 1, 11, 27,
    43, 71, 9, 1, 1, 7, 15, 21, 11, 81, 45, 1, 3, 7, 3, 25, 31, 65, 79, 1, 3, 1, 1, 19, 11, 3, 205, 1, 1, 5, 9, 19, 21,
    29, 157, 1, 3, 7, 11, 1, 33, 89, 185, 1, 3, 3, 3, 15, 9, 79, 71, 1, 3, 7, 11, 15, 39, 119, 27, 1, 1, 3, 1, 11, 31,
    97, 225, 1, 1, 1, 3, 23, 43, 57, 177, 1, 3, 7, 7, 17, 17, 37, 71, 1, 3, 1, 5, 27, 63, 123, 213, 1, 1, 3, 5, 11, 43,
    53, 133, 1, 3, 5, 5, 29, 17, 47, 173, 479, 1, 3, 3, 11, 3, 1, 109, 9, 69, 1, 1, 1, 5, 17, 39, 23, 5, 343, 1, 3, 1,
    5, 25, 15, 31, 103, 499, 1, 1, 1, 11, 11, 17, 63, 105, 183, 1, 1, 5, 11, 9, 29, 97, 231, 363, 1, 1, 5, 15, 19, 45,
    41, 7, 383, 1, 3, 7, 7, 31, 19, 83, 137, 221, 1, 1, 1, 3, 23, 15, 111, 223, 83, 1, 1, 5, 13, 31, 15, 55, 25, 161, 1,
    1, 3, 13, 25, 47, 39, 87, 257, 1, 1, 1, 11, 21, 53, 125, 249, 293, 1, 1, 7, 11, 11, 7, 57, 79, 323, 1, 1, 5, 5, 17,
    13, 81, 3, 131, 1, 1, 7, 13, 23, 7, 65, 251, 475, 1, 3, 5, 1, 9, 43, 3, 149, 11, 1, 1, 3, 13, 31, 13, 13, 255, 487,
    1, 3, 3, 1, 5, 63, 89, 91, 127, 1, 1, 3, 3, 1, 19, 123, 127, 237, 1, 1, 5, 7, 23, 31, 37, 243, 289, 1, 1, 5, 11, 17,
    53, 117, 183, 491, 1, 1, 1, 5, 1, 13, 13, 209, 345, 1, 1, 3, 15, 1, 57, 115, 7, 33, 1, 3, 1, 11, 7, 43, 81, 207,
    175, 1, 3, 1, 1, 15, 27, 63, 255, 49, 1, 3, 5, 3, 27, 61, 105, 171, 305, 1, 1, 5, 3, 1, 3, 57, 249, 149, 1, 1, 3, 5,
    5, 57, 15, 13, 159, 1, 1, 1, 11, 7, 11, 105, 141, 225, 1, 3, 3, 5, 27, 59, 121, 101, 271, 1, 3, 5, 9, 11, 49, 51,
    59, 115, 1, 1, 7, 1, 23, 45, 125, 71, 419, 1, 1, 3, 5, 23, 5, 105, 109, 75, 1, 1, 7, 15, 7, 11, 67, 121, 453, 1, 3,
    7, 3, 9, 13, 31, 27, 449, 1, 3, 1, 15, 19, 39, 39, 89, 15, 1, 1, 1, 1, 1, 33, 73, 145, 379, 1, 3, 1, 15, 15, 43, 29,
    13, 483, 1, 1, 7, 3, 19, 27, 85, 131, 431, 1, 3, 3, 3, 5, 35, 23, 195, 349, 1, 3, 3, 7, 9, 27, 39, 59, 297, 1, 1, 3,
    9, 11, 17, 13, 241, 157, 1, 3, 7, 15, 25, 57, 33, 189, 213, 1, 1, 7, 1, 9, 55, 73, 83, 217, 1, 3, 3, 13, 19, 27, 23,
    113, 249, 1, 3, 5, 3, 23, 43, 3, 253, 479, 1, 1, 5, 5, 11, 5, 45, 117, 217, 1, 3, 3, 7, 29, 37, 33, 123, 147, 1, 3,
    1, 15, 5, 5, 37, 227, 223, 459, 1, 1, 7, 5, 5, 39, 63, 255, 135, 487, 1, 3, 1, 7, 9, 7, 87, 249, 217, 599, 1, 1, 3,
    13, 9, 47, 7, 225, 363, 247, 1, 3, 7, 13, 19, 13, 9, 67, 9, 737, 1, 3, 5, 5, 19, 59, 7, 41, 319, 677, 1, 1, 5, 3,
    31, 63, 15, 43, 207, 789, 1, 1, 7, 9, 13, 39, 3, 47, 497, 169, 1, 3, 1, 7, 21, 17, 97, 19, 415, 905, 1, 3, 7, 1, 3,
    31, 71, 111, 165, 127, 1, 1, 5, 11, 1, 61, 83, 119, 203, 847, 1, 3, 3, 13, 9, 61, 19, 97, 47, 35, 1, 1, 7, 7, 15,
    29, 63, 95, 417, 469, 1, 3, 1, 9, 25, 9, 71, 57, 213, 385, 1, 3, 5, 13, 31, 47, 101, 57, 39, 341, 1, 1, 3, 3, 31,
    57, 125, 173, 365, 551, 1, 3, 7, 1, 13, 57, 67, 157, 451, 707, 1, 1, 1, 7, 21, 13, 105, 89, 429, 965, 1, 1, 5, 9,
    17, 51, 45, 119, 157, 141, 1, 3, 7, 7, 13, 45, 91, 9, 129, 741, 1, 3, 7, 1, 23, 57, 67, 141, 151, 571, 1, 1, 3, 11,
    17, 47, 93, 107, 375, 157, 1, 3, 3, 5, 11, 21, 43, 51, 169, 915, 1, 1, 5, 3, 15, 55, 101, 67, 455, 625, 1, 3, 5, 9,
    1, 23, 29, 47, 345, 595, 1, 3, 7, 7, 5, 49, 29, 155, 323, 589, 1, 3, 3, 7, 5, 41, 127, 61, 261, 717,
  ],
} as const
